#!/usr/bin/env python3
"""Writes elementary-values.txt: values that the tests of the ball functions compare with.

Made with mpmath 1.3 (a general-purpose library of arbitrary-precision arithmetic), independent of the code under test.
A line is: function, argument as mantissa and power of two (exactly), value as decimal digits and power of ten.
The value is digits * 10^power with a relative error below 10^(2 - number of digits).
Run it in this folder: python3 elementary-values.py > elementary-values.txt
"""
import random
from mpmath import mp, mpf, exp, log, pi, sqrt, gamma, nstr, ldexp

CONSTANT_DIGITS = 1300
FUNCTION_DIGITS = 360
SPARE_DIGITS = 40


def write(function, mantissa, power, value, digits):
    if value == 0:
        print(function, mantissa, power, 0, 0)
        return
    sign = "-" if value < 0 else ""
    text = nstr(abs(value), digits, min_fixed=1, max_fixed=0, show_zero_exponent=True, strip_zeros=False)
    number, exponent = text.split("e")
    whole, fraction = number.split(".")
    print(function, mantissa, power, sign + whole + fraction, int(exponent) - len(fraction))


def dyadic(value):
    """Mantissa and power of two of a Python float."""
    numerator, denominator = value.as_integer_ratio()
    return numerator, 1 - denominator.bit_length()


def exponential_arguments():
    yield from [(m, 0) for m in (1, -1, 2, -2, 10, -10, 100, -100, 700, -700, 100000, -100000)]
    yield from [(s, -k) for s in (1, -1) for k in (1, 2, 10, 53, 200, 1000)]
    # Next to multiples of ln 2, where the reduced argument is almost 0 or almost ln 2.
    for k in (1, -1, 2, 5, -17, 1000, -1000):
        yield dyadic(float(k * log(2)))
    # Where the exponential is next to 2^k within a thousand bits: ln 2 itself to 1100 bits.
    yield int(log(2) * mpf(2) ** 1100), -1100
    yield int(log(2) * mpf(2) ** 1100) + 1, -1100
    generator = random.Random(20260101)
    for scale in (1e-9, 1e-3, 1.0, 1.0, 1.0, 30.0, 30.0, 700.0):
        yield dyadic(generator.uniform(-scale, scale))


def logarithm_arguments():
    yield from [(m, 0) for m in (2, 3, 5, 10, 1000, 10**30)]
    # At and next to the ends of the reduced range.
    yield from [(3, -1), (3, -2), (3 * 2**50 + 1, -51), (3 * 2**50 - 1, -51), (3 * 2**50 + 1, -52), (3 * 2**50 - 1, -52)]
    # Next to 1, on both sides of where another series takes over.
    for k in (1, 5, 19, 20, 21, 22, 23, 53, 200, 1000):
        yield 2**k + 1, -k
        yield 2**k - 1, -k
    yield from [(1, -1074), (2**53 - 1, 971), (5, 100000), (5, -100000)]
    generator = random.Random(20260102)
    for _ in range(8):
        yield dyadic(generator.uniform(0.5, 2.0))
    for _ in range(4):
        yield dyadic(10 ** generator.uniform(-300, 300))


def main():
    mp.dps = CONSTANT_DIGITS + SPARE_DIGITS
    for name, value in (("pi", +pi), ("ln2", log(2)), ("sqrtpi", sqrt(pi)), ("sqrt2", sqrt(mpf(2)))):
        write(name, 0, 0, value, CONSTANT_DIGITS)
    write("exp", 1, 0, exp(mpf(1)), CONSTANT_DIGITS)
    write("log", 3, 0, log(mpf(3)), CONSTANT_DIGITS)
    # An argument next to 1 costs a logarithm as many digits as it has leading zeros.
    mp.dps = FUNCTION_DIGITS + SPARE_DIGITS + 320
    for mantissa, power in exponential_arguments():
        write("exp", mantissa, power, exp(ldexp(mpf(mantissa), power)), FUNCTION_DIGITS)
    for mantissa, power in logarithm_arguments():
        write("log", mantissa, power, log(ldexp(mpf(mantissa), power)), FUNCTION_DIGITS)
    for k in (-200, -33, -4, -3, -2, -1, 0, 1, 2, 3, 4, 10, 33, 170, 171, 500):
        write("gamma", 2 * k + 1, -1, gamma(mpf(2 * k + 1) / 2), FUNCTION_DIGITS)


main()
