using System;
using System.IO;
using System.Threading;
using GaussGen.Tool.Output;
using GaussGen.Tool.Tests.Fixtures;
using Xunit;

namespace GaussGen.Tool.Tests.Output;

/// <summary>A file is whole or not there.</summary>
public sealed class WholeFileTests : IDisposable
{
    private readonly Folder _folder = new();

    [Fact]
    public void The_old_file_stays_until_the_new_one_is_whole()
    {
        string path = _folder.Add("out.txt", [1]);
        WholeFile.Write(path, stream =>
        {
            stream.Write([2, 3]);
            stream.Flush();
            Assert.Equal([1], File.ReadAllBytes(path));
        }, CancellationToken.None);
        Assert.Equal([2, 3], File.ReadAllBytes(path));
        Assert.Equal([path], Directory.GetFiles(_folder.Path));
    }

    [Fact]
    public void An_interruption_or_an_error_leaves_the_old_file_alone()
    {
        string path = _folder.Add("out.txt", [1]);
        using CancellationTokenSource interruption = new();
        Assert.Throws<OperationCanceledException>(() => WholeFile.Write(path, stream =>
        {
            stream.Write([2]);
            interruption.Cancel();
        }, interruption.Token));
        Assert.Throws<UnwritableException>(() => WholeFile.Write(path, stream =>
        {
            stream.Write([2]);
            throw new IOException("disk full");
        }, CancellationToken.None));
        Assert.Equal([1], File.ReadAllBytes(path));
        Assert.Equal([path], Directory.GetFiles(_folder.Path));
    }

    [Fact]
    public void A_device_is_not_replaced_by_a_file()
    {
        string path = _folder.Add("out.txt", [1]);
        Assert.False(WholeFile.IsDevice(path));
        Assert.False(WholeFile.IsDevice("/dev/no such device"));
        if (!OperatingSystem.IsWindows())
        {
            Assert.True(WholeFile.IsDevice("/dev/null"));
            WholeFile.Write("/dev/null", stream => stream.WriteByte(1), CancellationToken.None);
            Assert.Empty(File.ReadAllBytes("/dev/null"));
        }
    }

    [Fact]
    public void A_folder_in_the_place_of_the_file_is_an_error() =>
        Assert.Throws<UnwritableException>(() => WholeFile.Write(_folder.Path, stream => stream.WriteByte(1), CancellationToken.None));

    [Fact]
    public void Control_characters_and_endless_names_do_not_reach_a_line()
    {
        Assert.Equal("a\uFFFD\uFFFDb\uFFFD", PlainText.OneLine("a\u001b\nb\u202e"));
        Assert.Equal(1025, PlainText.OneLine(new string('x', 5000)).Length);
        Assert.Equal("Größe 船", PlainText.OneLine("Größe 船"));
    }

    public void Dispose() => _folder.Dispose();
}
