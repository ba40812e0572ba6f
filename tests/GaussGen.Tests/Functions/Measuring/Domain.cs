namespace GaussGen.Functions.Measuring;

/// <summary>The arguments that a function takes, and where most of them are measured.</summary>
internal enum Domain
{
    /// <summary>All numbers; most points lie within 40 of zero.</summary>
    Line,

    /// <summary>All numbers of any magnitude.</summary>
    WideLine,

    /// <summary>From −27 on, up to the largest number.</summary>
    Scaled,

    /// <summary>From 0 to 1.</summary>
    Unit,

    /// <summary>From −1 to 1.</summary>
    SignedUnit,

    /// <summary>Two numbers, the first not above the second.</summary>
    Interval,
}
