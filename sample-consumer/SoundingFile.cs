using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;

namespace SurveyBoat;

/// <summary>What a file of soundings held: the readings, and a sentence for each line that is none.</summary>
internal sealed record SoundingFile(IReadOnlyList<Sounding> Soundings, IReadOnlyList<string> Skipped)
{
    private const string Header = "station,range_m,range_deviation_m,wave_deviation_m";

    // The outermost of the sixteen nodes is 6.6 standard deviations from the mean, and no echo comes from behind the sounder.
    private const double LeastRangeInDeviations = 8.0;

    /// <summary>Reads a file line by line. Empty lines, the header and lines that begin with # say nothing.</summary>
    public static SoundingFile Read(string path)
    {
        List<Sounding> soundings = [];
        List<string> skipped = [];
        int number = 0;
        foreach (string line in File.ReadLines(path))
        {
            number++;
            if (string.IsNullOrWhiteSpace(line) || line[0] == '#' || line == Header)
            {
                continue;
            }

            if (Parse(line, out string problem) is Sounding sounding)
            {
                soundings.Add(sounding);
            }
            else
            {
                skipped.Add($"line {number}: {problem}");
            }
        }

        return new SoundingFile(soundings, skipped);
    }

    private static Sounding? Parse(string line, out string problem)
    {
        string[] fields = line.Split(',', StringSplitOptions.TrimEntries);
        double[] numbers = new double[3];
        problem = fields.Length == 4 ? string.Empty : $"it has {fields.Length} fields instead of 4 ({Header})";
        for (int i = 0; i < numbers.Length && problem.Length == 0; i++)
        {
            if (!double.TryParse(fields[i + 1], NumberStyles.Float, CultureInfo.InvariantCulture, out numbers[i])
                || !double.IsFinite(numbers[i]) || numbers[i] < 0.0)
            {
                problem = $"\"{fields[i + 1]}\" is not a length in metres, like 4.70";
            }
        }

        if (problem.Length == 0 && (numbers[0] == 0.0 || numbers[0] < LeastRangeInDeviations * numbers[1]))
        {
            problem = $"a range of {numbers[0]} m is not safely above zero: "
                + $"it must be at least {LeastRangeInDeviations} of its standard deviations";
        }

        return problem.Length == 0 ? new Sounding(fields[0], numbers[0], numbers[1], numbers[2]) : null;
    }
}
