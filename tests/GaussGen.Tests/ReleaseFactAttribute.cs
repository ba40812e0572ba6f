using Xunit;

namespace GaussGen.Tests;

/// <summary>
/// A fact about optimised code. Without optimisation the runtime allocates in RuntimeHelpers.CreateSpan, and the JIT removes
/// no bounds check, so that nothing can be learnt from a Debug build.
/// </summary>
internal sealed class ReleaseFactAttribute : FactAttribute
{
    public ReleaseFactAttribute()
    {
#if DEBUG
        Skip = "Says something about optimised code only; run with -c Release.";
#endif
    }
}
