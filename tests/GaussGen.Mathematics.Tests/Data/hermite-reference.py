"""Writes hermite-reference.csv: Gauss-Hermite nodes and weights to 60 significant digits by mpmath 1.3.

Usage: python3 hermite-reference.py > hermite-reference.csv

Independent of the library under test in method and in arithmetic: the zeros are bracketed by the sign changes of the
polynomial in its explicit power form (exact integers), refined by bisection and Newton's method with 400 digits, and the
weight is the reciprocal of the sum of the squared orthonormal polynomials at the zero, not a formula with the derivative.
"""
import sys
from fractions import Fraction
from math import factorial

from mpmath import mp, mpf, sqrt, pi, nstr

mp.dps = 400


def coefficients(n):
    """Integer coefficients of He_n, by ascending power."""
    result = [0] * (n + 1)
    for m in range(n // 2 + 1):
        result[n - 2 * m] = (-1) ** m * factorial(n) // (factorial(m) * factorial(n - 2 * m) * 2 ** m)
    return result


def exact_sign(c, x):
    """Sign of the polynomial at a rational number, exactly."""
    value = 0
    power = 1
    for a in reversed(c):
        value = value * x.numerator + a * power
        power *= x.denominator
    return (value > 0) - (value < 0)


def positive_zeros(n):
    c = coefficients(n)
    d = [k * a for k, a in enumerate(c)][1:]
    # Neighbouring zeros are at least pi/sqrt(4n+2) apart (Sturm comparison with the oscillator equation).
    step = Fraction(1, max(4, int(2 * (n ** 0.5))))
    zeros = []
    x = Fraction(1, 10 ** 6)
    sign = exact_sign(c, x)
    while len(zeros) < n // 2:
        y = x + step
        next_sign = exact_sign(c, y)
        if next_sign * sign < 0:
            low, high = x, y
            for _ in range(30):
                middle = (low + high) / 2
                if exact_sign(c, middle) * sign > 0:
                    low = middle
                else:
                    high = middle
            z = mpf(low.numerator) / low.denominator
            for _ in range(12):
                z -= mp.polyval(c[::-1], z) / mp.polyval(d[::-1], z)
            assert mpf(low.numerator) / low.denominator <= z <= mpf(high.numerator) / high.denominator
            zeros.append(z)
        x, sign = y, next_sign
    return zeros


def christoffel(n, x):
    """1 / sum of p_k(x)^2 over k < n, p_k orthonormal for the standard normal density."""
    before, current, total = mpf(0), mpf(1), mpf(1)
    for k in range(n - 1):
        before, current = current, (x * current - sqrt(mpf(k)) * before) / sqrt(mpf(k + 1))
        total += current ** 2
    return 1 / total


def main():
    out = sys.stdout
    out.write("# made by hermite-reference.py with mpmath; nodes from 0 up; do not edit\n")
    out.write("points,convention,node,weight\n")
    for n in (7, 20, 64, 200):
        nodes = ([mpf(0)] if n % 2 else []) + positive_zeros(n)
        assert len(nodes) == (n + 1) // 2
        weights = [christoffel(n, x) for x in nodes]
        total = sum(2 * w if x else w for x, w in zip(nodes, weights))
        assert abs(total - 1) < mpf(10) ** -100
        for name, node_factor, weight_factor in (("Probabilist", mpf(1), mpf(1)), ("Physicist", 1 / sqrt(mpf(2)), sqrt(pi))):
            for x, w in zip(nodes, weights):
                out.write("%d,%s,%s,%s\n" % (
                    n, name, nstr(x * node_factor, 60, strip_zeros=False), nstr(w * weight_factor, 60, strip_zeros=False)))


main()
