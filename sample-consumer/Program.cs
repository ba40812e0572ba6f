using System;
using System.Globalization;
using System.IO;
using System.Linq;
using SurveyBoat;

// The same digits on every machine.
CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;

if (args.Length > 1)
{
    return Refuse("Usage: SurveyBoat [soundings.csv]");
}

string path = args.Length == 1 ? args[0] : Path.Combine(AppContext.BaseDirectory, "soundings.csv");
SoundingFile file;
try
{
    file = SoundingFile.Read(path);
}
catch (Exception exception) when (exception is IOException or UnauthorizedAccessException)
{
    return Refuse($"The soundings cannot be read: {exception.Message}");
}

Console.WriteLine($"{Path.GetFileName(path)}: {file.Soundings.Count} soundings read, lines skipped: {file.Skipped.Count}");
foreach (string skipped in file.Skipped)
{
    Console.WriteLine($"  {skipped}");
}

if (file.Soundings.Count == 0)
{
    return Refuse("There is no sounding to work with.");
}

Simulation simulation = new(draws: 1_000_000, seed: 1);
Report report = new();
report.Table("Mean echo, relative to one metre", file.Soundings.Select(sounding => Echo.At(sounding, simulation)));
report.Table("Mean echo of the readings that the gate lets pass", file.Soundings.Select(sounding => GatedEcho.At(sounding, simulation)));
report.Table("Probability that a wave slaps the bow", file.Soundings.Select(sounding => WaveSlap.At(sounding, simulation)));
report.Table("Drift with the current", Drift.Compare(simulation));
report.Table("Across the tide", Crabbing.Compare(simulation));
Report.Line($"  the rule's own estimate of its error in the crab angle: {Crabbing.EstimatedError():G2} degrees");
report.Summary();
return report.ExitCode;

static int Refuse(string message)
{
    Console.Error.WriteLine(message);
    return 2;
}
