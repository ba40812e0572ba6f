using System;
using System.IO;
using System.Linq;
using System.Reflection.PortableExecutable;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Claims;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Tests.Fixtures;
using Microsoft.CodeAnalysis;
using Xunit;

namespace GaussGen.Tool.Tests.Reading;

/// <summary>Whatever a file holds, reading it ends with a result or with the one error, in bounded time and memory.</summary>
public class HostileImageTests
{
    private const int Cases = 50_000;

    // A table may have 64 MiB, and no case here names more than one.
    private const long MostMemory = 80L << 20;

    private const string Source = """
        using System;
        using GaussGen;
        namespace Survey
        {
            [GaussHermite(3)] static class A
            {
                public const int PointCount = 3;
                public static ReadOnlySpan<double> Nodes => new double[] { -1.7320508075688772, 0.0, 1.7320508075688772 };
                private static readonly double[] Table = { 0.16666666666666666, 0.6666666666666666, 0.16666666666666666 };
                public static ReadOnlySpan<double> Weights => Table;
                [NormalMoments(1.5, 0.25, MaximumOrder = 2, Format = NumberFormat.Binary32)]
                public static class B
                {
                    public const float Raw1 = 1.5f;
                    static readonly float[] Few = { 1f, 1.5f };
                    public static ReadOnlySpan<float> Raw => Few;
                    public static ReadOnlySpan<byte> Bytes => new byte[] { 1, 2, 3 };
                }
            }
            [GaussNormalMixture(1, new[] { 0.25, 0.75 }, new[] { -1.0, 1.0 }, new[] { 1.0, 2.0 }, ErrorEstimate = true)] static class C
            {
                [GaussEvenExponential(1, -2, 0.5)] static class D { public const double NormalizingIntegral = 1; }
                [System.CodeDom.Compiler.GeneratedCode("GaussGen", "0.1.0")]
                static double ExpectationWithError(Func<double, double> integrand, out double error)
                {
                    double companion = integrand(0.0);
                    error = 0.5 * Math.Abs(companion - integrand(1.0));
                    return companion;
                }
            }
        }
        """;

    private static readonly byte[] Untouched = FixtureCompiler.Compile(Source);

    [Fact]
    public void Fifty_thousand_damaged_files()
    {
        int read = 0;
        int refused = 0;
        Parallel.For(0, Cases, index =>
        {
            byte[] image = Damaged(new Random(index));
            long before = GC.GetAllocatedBytesForCurrentThread();
            try
            {
                _ = Read(image);
                _ = Interlocked.Increment(ref read);
            }
            catch (UnreadableException error)
            {
                Assert.DoesNotContain('\n', error.Message);
                _ = Interlocked.Increment(ref refused);
            }

            Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 0, MostMemory);
        });

        Assert.Equal(Cases, read + refused);
        Assert.InRange(read, 1000, Cases - 1000);
    }

    [Fact]
    public void Every_truncation_of_a_file()
    {
        Parallel.For(0, Untouched.Length, length =>
        {
            try
            {
                _ = Read(Untouched[..length]);
            }
            catch (UnreadableException)
            {
            }
        });
    }

    [Fact]
    public void Every_byte_of_the_metadata_set_to_extremes()
    {
        using PEReader executable = new(new MemoryStream(Untouched));
        PEHeaders headers = executable.PEHeaders;
        Parallel.For(headers.MetadataStartOffset, headers.MetadataStartOffset + headers.MetadataSize, place =>
        {
            foreach (byte value in new byte[] { 0, 1, 0x7F, 0x80, 0xFF })
            {
                byte[] image = [.. Untouched];
                image[place] = value;
                try
                {
                    _ = Read(image);
                }
                catch (UnreadableException)
                {
                }
            }
        });
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(64)]
    [InlineData(100_000)]
    public void Bytes_that_are_no_image(int length)
    {
        byte[] bytes = new byte[length];
        new Random(length).NextBytes(bytes);
        UnreadableException error = Assert.Throws<UnreadableException>(() => AssemblyImage.FromBytes(bytes));
        Assert.Equal(UnreadableReason.NotAnImage, error.Reason);
    }

    /// <summary>Sizes that would fill the memory if they were believed: of an array, of mapped data, of an attribute's array.</summary>
    [Theory]
    [InlineData("[GaussHermite(1)] class T { static readonly double[] A = new double[0x12345678]; public static ReadOnlySpan<double> Nodes => A; }", 0x12345678, 0x7FFFFFFF)]
    [InlineData("[GaussHermite(1)] class T { static readonly double[] A = new double[0x12345678]; public static ReadOnlySpan<double> Nodes => A; }", 0x12345678, 0x00900000)]
    [InlineData("[GaussHermite(1)] class T { public static ReadOnlySpan<double> Nodes => new double[] { 1, 2, 3, 4, 5 }; }", 40, 0x7FFFFFFF)]
    public void Stated_sizes_are_not_believed(string source, int size, int changed)
    {
        byte[] image = FixtureCompiler.Compile("using System; using GaussGen; " + source);
        byte[] from = BitConverter.GetBytes(size);
        for (int place = 0; place + from.Length <= image.Length; place++)
        {
            if (image.AsSpan(place, from.Length).SequenceEqual(from))
            {
                BitConverter.TryWriteBytes(image.AsSpan(place), changed);
            }
        }

        long before = GC.GetAllocatedBytesForCurrentThread();
        try
        {
            Assert.DoesNotContain("Nodes", Assert.Single(Read(image).Types).Spans.Keys);
        }
        catch (UnreadableException)
        {
        }

        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 0, 16L << 20);
    }

    /// <summary>A list of an attribute: null, longer than its bytes, and one that is shared until it fills the memory.</summary>
    [Theory]
    [InlineData(0x7FFFFFFF)]
    [InlineData(0x00010000)]
    [InlineData(3)]
    [InlineData(1)]
    public void A_stated_length_of_a_list_is_not_believed(int length)
    {
        byte[] image = FixtureCompiler.Compile("[GaussGen.GaussEvenExponential(5, 0.3125, 0.625)] class T { }");
        byte[] list = [2, 0, 0, 0, .. BitConverter.GetBytes(0.3125)];
        int place = image.AsSpan().IndexOf(list);
        Assert.True(BitConverter.TryWriteBytes(image.AsSpan(place), length));
        long before = GC.GetAllocatedBytesForCurrentThread();
        FoundType type = Assert.Single(Read(image).Types);
        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 0, 16L << 20);
        Assert.Empty(type.Declarations);
        Assert.Contains("the arguments of the attribute cannot be read", type.UnreadDeclarations["GaussEvenExponential"], StringComparison.Ordinal);
    }

    [Fact]
    public void A_list_that_is_null_or_of_another_type_is_said()
    {
        byte[] none = FixtureCompiler.Compile("[GaussGen.GaussEvenExponential(5, null)] class T { }");
        Declaration declaration = Assert.Single(Assert.Single(Read(none).Types).Declarations);
        Assert.Null(declaration.Arguments[1]);
        ClaimException error = Assert.Throws<ClaimException>(() => ClaimTable.Read(ClaimTable.Find("GaussEvenExponential")!, declaration));
        Assert.StartsWith("argument 2 of [GaussEvenExponential] is null", error.Message, StringComparison.Ordinal);

        byte[] texts = FixtureCompiler.CompileAgainst(
            "namespace GaussGen { public class GaussEvenExponentialAttribute : System.Attribute { public GaussEvenExponentialAttribute(int points, params string[] texts) { } } }",
            "GaussGen",
            "[GaussGen.GaussEvenExponential(5, \"0.5\")] class T { }");
        declaration = Assert.Single(Assert.Single(Read(texts).Types).Declarations);
        error = Assert.Throws<ClaimException>(() => ClaimTable.Read(ClaimTable.Find("GaussEvenExponential")!, declaration));
        Assert.StartsWith("argument 2 of [GaussEvenExponential] is not a list of binary64 numbers", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Lists_that_share_their_bytes_do_not_fill_the_memory()
    {
        string list = string.Join(',', new int[4096]);
        byte[] image = FixtureCompiler.CompileAgainst(
            "namespace GaussGen { public class ManyAttribute : System.Attribute { public ManyAttribute(params byte[] many) { } } }",
            "GaussGen",
            string.Concat(Enumerable.Range(0, 400).Select(number => $"[GaussGen.Many({list})] class T{number} {{ }}\n")));
        Assert.InRange(image.Length, 0, 100_000);
        long before = GC.GetAllocatedBytesForCurrentThread();
        FoundAssembly found = Read(image);
        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 0, MostMemory);
        Assert.Equal(256, found.Types.Count(type => type.Declarations.Count == 1));
        Assert.Equal(144, found.Types.Count(type => type.UnreadDeclarations.ContainsKey("Many")));
    }

    [Fact]
    public void A_native_image_is_named_as_such()
    {
        UnreadableException error = Assert.Throws<UnreadableException>(() => AssemblyImage.FromBytes(Images.Native()));
        Assert.Equal(UnreadableReason.NativeImage, error.Reason);
        Assert.True(error.IsUsualInFolders);
    }

    [Fact]
    public void A_reference_assembly_is_named_as_such()
    {
        UnreadableException error = Assert.Throws<UnreadableException>(() => Read(Images.Reference(Source)));
        Assert.Equal(UnreadableReason.ReferenceAssembly, error.Reason);
        Assert.True(error.IsUsualInFolders);
    }

    [Fact]
    public void A_module_without_manifest_is_refused()
    {
        Compilation compilation = FixtureCompiler.CreateCompilation(Framework.Net8, OptimizationLevel.Release, "Boat", ["class T { }"], []);
        byte[] image = FixtureCompiler.Emit(compilation.WithOptions(compilation.Options.WithOutputKind(OutputKind.NetModule)));
        Assert.Contains("manifest", Assert.Throws<UnreadableException>(() => Read(image)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Nothing_of_the_assembly_runs()
    {
        string mark = Path.Combine(Path.GetTempPath(), "gaussgen-" + Guid.NewGuid().ToString("N"));
        byte[] image = FixtureCompiler.Compile(
            $$"""
            using System; using System.IO; using System.Runtime.CompilerServices; using GaussGen;
            static class Start { [ModuleInitializer] internal static void Run() => File.WriteAllText(@"{{mark}}", "ran"); }
            [GaussHermite(1)] static class T
            {
                static T() => Start.Run();
                static readonly double[] Table = { 0.0 };
                public static ReadOnlySpan<double> Nodes => Table;
                public static ReadOnlySpan<double> Weights { get { Start.Run(); return Table; } }
            }
            """);

        FoundType type = Assert.Single(Read(image).Types);
        Assert.Equal(["Nodes"], type.Spans.Keys);
        Assert.Equal(["Weights"], type.UnreadSpans.Keys);
        Assert.False(File.Exists(mark));

        // The same code does write the file once it is allowed to run.
        System.Reflection.Assembly loaded = System.Reflection.Assembly.Load(image);
        RuntimeHelpersRun(loaded);
        Assert.True(File.Exists(mark));
        File.Delete(mark);
    }

    private static void RuntimeHelpersRun(System.Reflection.Assembly loaded) =>
        System.Runtime.CompilerServices.RuntimeHelpers.RunModuleConstructor(loaded.ManifestModule.ModuleHandle);

    private static FoundAssembly Read(byte[] bytes)
    {
        using AssemblyImage image = AssemblyImage.FromBytes(bytes);
        return AssemblyReader.Read(image, CancellationToken.None);
    }

    /// <summary>Damage of one of four kinds, the interesting places first: headers, tables, heaps and code.</summary>
    private static byte[] Damaged(Random random)
    {
        byte[] image = [.. Untouched];
        switch (random.Next(4))
        {
            case 0:
                for (int flips = 1 << random.Next(6); flips > 0; flips--)
                {
                    image[random.Next(image.Length)] ^= (byte)(1 << random.Next(8));
                }

                return image;
            case 1:
                image = image[..random.Next(image.Length)];
                return image;
            case 2:
                int start = random.Next(image.Length);
                random.NextBytes(image.AsSpan(start, Math.Min(1 << random.Next(10), image.Length - start)));
                return image;
            default:
                int from = random.Next(image.Length - 8);
                int[] extremes = [0, 1, -1, int.MaxValue, int.MinValue, 0x00FFFFFF, random.Next()];
                BitConverter.TryWriteBytes(image.AsSpan(from), extremes[random.Next(extremes.Length)]);
                return image;
        }
    }
}
