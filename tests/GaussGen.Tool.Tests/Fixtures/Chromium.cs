using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.IO;
using System.Threading.Tasks;
using StbImageSharp;
using Xunit;

namespace GaussGen.Tool.Tests.Fixtures;

/// <summary>A test that needs the browser; skipped, with the reason, where it is not installed.</summary>
[AttributeUsage(AttributeTargets.Method)]
public sealed class ChromiumFactAttribute : FactAttribute
{
    public ChromiumFactAttribute() => Skip = File.Exists(Chromium.Program) ? null : $"{Chromium.Program} is not installed.";
}

/// <summary>Debian's Chromium without a window.</summary>
internal static class Chromium
{
    public const string Program = "/usr/bin/chromium";

    private static readonly TimeSpan Limit = TimeSpan.FromMinutes(3);

    /// <summary>A picture of the top of a page.</summary>
    public static async Task<ImageResult> PictureAsync(string page, Folder folder, int width, int height, bool isDark)
    {
        string picture = folder.Below("page.png");
        File.Delete(picture);

        // The setting behind prefers-color-scheme: 0 is dark, 1 is light.
        _ = await RunAsync(
            folder, page, $"--window-size={width},{height}", $"--blink-settings=preferredColorScheme={(isDark ? 0 : 1)}", $"--screenshot={picture}");
        return ImageResult.FromMemory(await File.ReadAllBytesAsync(picture), ColorComponents.RedGreenBlue);
    }

    /// <summary>The document as the browser understood it, written out again.</summary>
    public static Task<string> DocumentAsync(string page, Folder folder, int width) =>
        RunAsync(folder, page, $"--window-size={width},900", "--dump-dom");

    private static async Task<string> RunAsync(Folder folder, string page, params string[] options)
    {
        List<string> arguments =
        [
            "--headless", "--no-sandbox", "--disable-gpu", "--hide-scrollbars", $"--user-data-dir={folder.Below("profile")}",
            .. options, new Uri(page).AbsoluteUri,
        ];
        using Process process = Process.Start(new ProcessStartInfo(Program, arguments) { RedirectStandardOutput = true, RedirectStandardError = true })!;
        Task<string> output = process.StandardOutput.ReadToEndAsync();
        Task<string> errors = process.StandardError.ReadToEndAsync();
        try
        {
            await process.WaitForExitAsync().WaitAsync(Limit);
        }
        catch (TimeoutException)
        {
            process.Kill(entireProcessTree: true);
            throw;
        }

        Assert.True(process.ExitCode == 0, await errors);
        return await output;
    }
}
