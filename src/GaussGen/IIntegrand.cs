namespace GaussGen;

/// <summary>
/// A function of one variable as a type, for a rule to integrate. A struct that implements it is compiled into the loop over
/// the nodes: no delegate, no allocation, and its fields are the function's parameters.
/// </summary>
/// <typeparam name="T">The number type of the rule: <see cref="double"/> or <see cref="float"/>.</typeparam>
/// <example>
/// <code>
/// internal readonly struct Attenuation(double perMetre) : IIntegrand&lt;double&gt;
/// {
///     public double Evaluate(double x) => Math.Exp(-perMetre * x);
/// }
///
/// double meanEcho = Sixteen.Expectation(4.2, 0.3, new Attenuation(0.5));
/// </code>
/// </example>
public interface IIntegrand<T>
{
    /// <summary>The value of the function.</summary>
    /// <param name="x">Where: the mean plus the standard deviation times a node, in the units of the mean.</param>
    /// <returns>The value at <paramref name="x"/>. It is called once for each node; what it throws reaches the caller.</returns>
    T Evaluate(T x);
}
