using System;
using System.IO;
using GaussGen.Generator.Tests.Support;
using Xunit;

namespace GaussGen.Generator.Tests.Emission;

/// <summary>
/// Whole generated files, as committed in the folder Golden: what a reviewer reads. A test that fails leaves the new text beside
/// the test assembly and says where.
/// </summary>
public sealed class GoldenTests
{
    private static readonly string Folder = Path.Combine(AppContext.BaseDirectory, "Golden");

    [Fact]
    public void A_rule() => Verify("Rule.txt", new Consumer(
        """
        using GaussGen;

        namespace SurveyBoat;

        [GaussHermite(3)]
        internal static partial class ThreeNodes { }
        """));

    [Fact]
    public void A_physicists_rule_in_arrays_on_a_nested_type() => Verify("PhysicistsRuleInArrays.txt", new Consumer(
        """
        using GaussGen;

        namespace SurveyBoat
        {
            public partial interface IBench
            {
                public readonly partial record struct @event
                {
                    [GaussHermite(4, Convention = HermiteConvention.Physicist, Format = NumberFormat.Binary32)]
                    public sealed partial record FourNodes;
                }
            }
        }
        """)
    { Framework = Framework.NetStandard20 });

    [Fact]
    public void Moments() => Verify("Moments.txt", new Consumer(
        """
        using GaussGen;

        [NormalMoments(1.5, 0.1, MaximumOrder = 3)]
        internal partial struct Wind { }
        """));

    [Fact]
    public void A_rule_with_a_scale_alone() => Verify("ScaleRule.txt", new Consumer(
        """
        using GaussGen;

        [GaussHalfRangeHermite(2)]
        internal static partial class Roll { }
        """));

    [Fact]
    public void A_rule_as_it_stands_with_a_constant() => Verify("FixedRule.txt", new Consumer(
        """
        using GaussGen;

        [GaussEvenExponential(3, 0, 1, Format = NumberFormat.Binary32)]
        internal static partial class Well { }
        """));

    [Fact]
    public void A_physicists_rule_with_an_error_estimate() => Verify("ErrorEstimate.txt", new Consumer(
        """
        using GaussGen;

        [GaussHermite(2, Convention = HermiteConvention.Physicist, ErrorEstimate = true)]
        internal static partial class Echo { }
        """));

    [Fact]
    public void A_nested_rule_with_an_error_estimate() => Verify("NestedRule.txt", new Consumer(
        """
        using GaussGen;

        [NestedHermite(1, ErrorEstimate = true)]
        internal static partial class Echo { }
        """));

    [Fact]
    public void Lists_in_arrays() => Verify("Lists.txt", new Consumer(
        """
        using GaussGen;

        [HalfIntegerGamma(2)]
        internal static partial class HalfGamma { }
        """)
    { Framework = Framework.NetStandard20 });

    [Fact]
    public void A_stand_in() => Verify("StandIn.txt", new Consumer(
        """
        using GaussGen;

        namespace SurveyBoat
        {
            [GaussHermite(0, Format = NumberFormat.Binary32)]
            internal partial class Mistaken<T>
            {
                private int Weights;
            }
        }
        """));

    private static void Verify(string name, Consumer consumer)
    {
        string actual = consumer.Run().Text;
        string path = Path.Combine(Folder, name);
        string expected = File.Exists(path) ? File.ReadAllText(path) : string.Empty;
        string received = Path.Combine(Folder, name + ".received");
        if (actual == expected)
        {
            File.Delete(received);
            return;
        }

        _ = Directory.CreateDirectory(Folder);
        File.WriteAllText(received, actual);
        Assert.Fail($"The generated text differs from {path}; the new one is {received}.");
    }
}
