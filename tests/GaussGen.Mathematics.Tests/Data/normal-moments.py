"""Writes normal-moments.csv: moments of normal distributions, by numerical integration and by hypergeometric functions.

Run: python3 normal-moments.py > normal-moments.csv     (mpmath 1.3.0)

Raw and absolute moments are computed at 60 digits in two ways that share nothing: the integral of x^k times the density
(tanh-sinh quadrature), and the confluent hypergeometric formulas of Winkelbauer (2012). They must agree to 40 digits.
The values are written as the nearest binary64 and binary32 encodings, in hexadecimal; the rounding is done here, on exact
rational numbers, by Python's own integers.
"""
from fractions import Fraction
from mpmath import mp, mpf, quad, exp, sqrt, pi, gamma, hyp1f1, hyperu, fabs, inf

mp.dps = 60

PARAMETERS = [(0.0, 1.0), (1.5, 0.25), (-1.5, 0.25), (0.1, 0.3), (-0.75, 3.0), (1e-3, 2.5), (100.0, 0.5)]
ORDERS = list(range(0, 13)) + [20, 25]


def exact(x):
    """The rational number that an mpf is."""
    sign, man, exponent, _ = x._mpf_
    value = Fraction(int(man)) * Fraction(2) ** exponent
    return -value if sign else value


def encode(x, precision, maximum):
    """Nearest encoding, ties to even; precision 53 and maximum exponent 1023 for binary64."""
    value = exact(x)
    bits = 64 if precision == 53 else 32
    if value == 0:
        return 0
    sign = 1 if value < 0 else 0
    value = abs(value)
    minimum = 2 - maximum - precision
    exponent = value.numerator.bit_length() - value.denominator.bit_length()
    if Fraction(2) ** exponent > value:
        exponent -= 1
    unit = max(exponent - precision + 1, minimum)
    scaled = value / Fraction(2) ** unit
    rounded = scaled.numerator // scaled.denominator
    rest = scaled - rounded
    if rest > Fraction(1, 2) or (rest == Fraction(1, 2) and rounded & 1):
        rounded += 1
    code = rounded + ((unit - minimum) << (precision - 1))
    infinity = ((1 << (bits - precision)) - 1) << (precision - 1)
    return min(code, infinity) | (sign << (bits - 1))


def integral(power, mean, sd):
    """E of power(X), split where the density or the power bends."""
    points = sorted({mean, mpf(0)} | {mean + j * sd for j in (-40, -20, -10, -5, -2, 2, 5, 10, 20, 40)})
    density = lambda x: power(x) * exp(-((x - mean) / sd) ** 2 / 2)
    return quad(density, points) / (sd * sqrt(2 * pi))


def raw(k, mean, sd):
    """Winkelbauer 2012, (12): with Kummer's function."""
    z = -(mean / sd) ** 2 / 2
    if k % 2 == 0:
        return sd ** k * mpf(2) ** (mpf(k) / 2) * gamma(mpf(k + 1) / 2) / sqrt(pi) * hyp1f1(-mpf(k) / 2, mpf(1) / 2, z)
    return mean * sd ** (k - 1) * mpf(2) ** (mpf(k + 1) / 2) * gamma(mpf(k) / 2 + 1) / sqrt(pi) * hyp1f1(
        mpf(1 - k) / 2, mpf(3) / 2, z)


def absolute(k, sd):
    """Winkelbauer 2012, (18)."""
    return sd ** k * mpf(2) ** (mpf(k) / 2) * gamma(mpf(k + 1) / 2) / sqrt(pi)


def agree(first, second):
    scale = max(fabs(first), fabs(second), mpf(10) ** -300)
    assert fabs(first - second) / scale < mpf(10) ** -40 or scale < mpf(10) ** -200, (first, second)
    return second


print("# made by normal-moments.py with mpmath at 60 digits; do not edit")
print("mean,standardDeviation,order,list,binary64,binary32")
for m, s in PARAMETERS:
    mean, sd = mpf(m), mpf(s)
    for k in ORDERS:
        values = {
            "Raw": agree(integral(lambda x: x ** k, mean, sd) if m or k % 2 == 0 else mpf(0), raw(k, mean, sd)),
            "Central": absolute(k, sd) if k % 2 == 0 else mpf(0),
            "Absolute": agree(integral(lambda x: fabs(x - mean) ** k, mean, sd), absolute(k, sd)),
        }
        for name, value in values.items():
            print(f"{m!r},{s!r},{k},{name},{encode(value, 53, 1023):016x},{encode(value, 24, 127):08x}")
