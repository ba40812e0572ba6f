"""High-precision values of the error functions and of the standard normal distribution.

    python3 error-functions.py > error-functions.csv

Needs Python 3 and mpmath 1.3. Each line: function, argument as a hexadecimal binary64 number, value with 25 digits. mpmath
computes with 400 digits; inverses by Newton's method in the logarithm of the tail.
"""
from mpmath import mp, mpf, erf, erfc, exp, log, sqrt, pi, nstr

# ln of a probability that is 1 but for 1e-149 needs the digits.
mp.dps = 400


def tail(x):
    return erfc(x / sqrt(mpf(2))) / 2


def quantile(p):
    p = mpf(p)
    if p > mpf(1) / 2:
        return -quantile_of(1 - p)
    return quantile_of(p)


def quantile_of(p):
    # Newton in the logarithm, which is nearly a parabola.
    x = -sqrt(-2 * log(p)) if p < mpf('0.3') else mpf(0)
    for _ in range(200):
        t = tail(-x)
        step = (log(t) - log(p)) * t * sqrt(2 * pi) * exp(x * x / 2)
        x -= step
        if abs(step) < mpf(10) ** -50:
            return x
    raise ArithmeticError('no root')


FUNCTIONS = {
    'Erf': erf,
    'Erfc': erfc,
    'ErfcScaled': lambda x: exp(x * x) * erfc(x),
    'Density': lambda x: exp(-x * x / 2) / sqrt(2 * pi),
    'LogDensity': lambda x: -x * x / 2 - log(2 * pi) / 2,
    'Cumulative': lambda x: tail(-x),
    'UpperTail': tail,
    'LogCumulative': lambda x: log(tail(-x)),
}
LINE = [-37.5, -20.25, -8.125, -5.5, -3.0, -2.1, -1.0, -0.7, -0.5, -0.3, -0.01, 1e-5, 0.2, 0.4999, 0.5, 0.9, 1.0, 1.7, 2.0, 2.5,
        3.25, 4.0, 5.9, 6.0, 8.0, 10.1, 15.0, 20.0, 26.0]

for name, function in FUNCTIONS.items():
    for x in LINE:
        if name == 'ErfcScaled' and x < -26:
            continue
        print(f'{name},{float(x).hex()},{nstr(function(mpf(x)), 25, min_fixed=0, max_fixed=0, strip_zeros=False)}')
for p in [1e-300, 1e-100, 1e-20, 1e-5, 0.003, 0.004, 0.1, 0.25, 0.3, 0.3125, 0.32, 0.4, 0.6, 0.75, 0.9, 0.975, 0.999, 1 - 2.0 ** -40]:
    print(f'Quantile,{float(p).hex()},{nstr(quantile(p), 25, min_fixed=0, max_fixed=0, strip_zeros=False)}')
for y in [1e-10, 0.001, 0.1, 0.3, 0.49, 0.5, 0.7, 0.9, 0.99, 0.999, 1 - 2.0 ** -30]:
    print(f'Inverse,{float(y).hex()},{nstr(-quantile((1 - mpf(y)) / 2) / sqrt(mpf(2)), 25, min_fixed=0, max_fixed=0, strip_zeros=False)}')
    print(f'Inverse,{float(-y).hex()},{nstr(quantile((1 - mpf(y)) / 2) / sqrt(mpf(2)), 25, min_fixed=0, max_fixed=0, strip_zeros=False)}')
