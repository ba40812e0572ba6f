namespace GaussGen.Mathematics.Proofs;

/// <summary>One of the equations Σ wᵢ xᵢᵏ = ∫ xᵏ w(x) dx that define a Gauss rule, put to the entries of a table.</summary>
/// <param name="Degree">k.</param>
/// <param name="Residual">
/// An upper bound of the magnitude of the difference of both sides, divided by the right one, with the entries taken for exact numbers.
/// </param>
/// <param name="Allowance">
/// How large the residual may be, rounded up, if every entry is at most half a unit in its last place from its true value.
/// </param>
/// <param name="Holds">Whether the residual is within the allowance. The comparison is made before either is rounded.</param>
public sealed record MomentEquation(int Degree, double Residual, double Allowance, bool Holds);
