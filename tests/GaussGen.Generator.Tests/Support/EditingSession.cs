using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using System.Reflection;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;

namespace GaussGen.Generator.Tests.Support;

/// <summary>A project that is edited while the generator keeps what it remembers, as in an editor.</summary>
internal sealed class EditingSession
{
    /// <summary>The names of all steps of the pipeline, found where they are defined so that none can be forgotten.</summary>
    public static readonly ImmutableArray<string> StepNames = typeof(TrackingNames)
        .GetFields(BindingFlags.Static | BindingFlags.Public)
        .Select(field => (string)field.GetRawConstantValue()!)
        .ToImmutableArray();

    private readonly Consumer _consumer;
    private CSharpCompilation _compilation;
    private GeneratorDriver _driver;

    public EditingSession(Consumer consumer)
    {
        _consumer = consumer;
        _compilation = consumer.Compile();
        _driver = CSharpGeneratorDriver.Create(
            [new TableGenerator().AsSourceGenerator()],
            parseOptions: consumer.ParseOptions,
            driverOptions: new GeneratorDriverOptions(IncrementalGeneratorOutputKind.None, trackIncrementalGeneratorSteps: true));
        Run();
    }

    public GeneratorRunResult Result { get; private set; }

    public WeakReference Compilation => new(_compilation);

    /// <summary>Replaces the text of a file.</summary>
    public void Edit(int file, Func<string, string> change)
    {
        SyntaxTree old = _compilation.SyntaxTrees[file];
        string before = old.ToString();
        string after = change(before);
        if (before == after)
        {
            throw new ArgumentException("The edit changes nothing.", nameof(change));
        }

        Update(compilation => compilation.ReplaceSyntaxTree(old, _consumer.Parse(after, old.FilePath)));
    }

    /// <summary>Changes the project.</summary>
    public void Update(Func<CSharpCompilation, CSharpCompilation> change)
    {
        _compilation = change(_compilation);
        Run();
    }

    /// <summary>Adds a file that is no source.</summary>
    public void Add(AdditionalText file)
    {
        _driver = _driver.AddAdditionalTexts([file]);
        Run();
    }

    /// <summary>Why each value of a step is what it is after the last edit.</summary>
    public IEnumerable<IncrementalStepRunReason> ReasonsOf(string step) => OutputsOf(step).Select(output => output.Reason);

    /// <summary>The values of a step after the last edit.</summary>
    public IEnumerable<object> ValuesOf(string step) => OutputsOf(step).Select(output => output.Value);

    private IEnumerable<(object Value, IncrementalStepRunReason Reason)> OutputsOf(string step) =>
        Result.TrackedSteps[step].SelectMany(run => run.Outputs);

    private void Run()
    {
        _driver = _driver.RunGenerators(_compilation);
        Result = _driver.GetRunResult().Results.Single();
    }
}
