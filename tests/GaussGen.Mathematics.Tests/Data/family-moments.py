"""Writes family-moments.csv: moments of truncated normal, half-normal, log-normal and even exponential distributions.

Run: python3 family-moments.py > family-moments.csv     (mpmath 1.3.0; a minute and a half)

Every moment is an integral by Gauss-Legendre or tanh-sinh quadrature over pieces of the line, at 100 digits and more; nothing of the recurrences,
series and binomial sums of the constructions. Closed forms check the integrals where there are some, to 60 digits. Moments that symmetry
makes zero are left out.
"""
from mpmath import mp, mpf, quad, exp, log, sqrt, pi, erf, erfc, gamma, fabs, inf, binomial, nstr

mp.dps = 110
DIGITS = 70


def agree(first, second):
    assert fabs(first - second) <= fabs(second) * mpf(10) ** -60, (first, second)


def scaled_quad(f, points):
    """The quadrature stops by an absolute tolerance, so it is given an integrand of size one on an interval of size one."""
    width = points[-1] - points[0]
    places = points + [(p + q) / 2 for p, q in zip(points, points[1:])]
    size = max(fabs(f(p)) for p in places)
    inner = [(p - points[0]) / width for p in points]
    return size * width * quad(lambda t: f(points[0] + width * t) / size, inner, method="gauss-legendre")


def table(family, parameters, orders, density, pieces):
    """Raw, central and absolute moments of the density, given up to a factor, over the pieces between the points."""
    def integral(f, points):
        return scaled_quad(lambda x: f(x) * density(x), points)

    mass = integral(lambda x: mpf(1), pieces)
    mean = integral(lambda x: x, pieces) / mass
    below = [p for p in pieces if p < mean] + [mean]
    above = [mean] + [p for p in pieces if p > mean]
    values = {}
    for k in orders:
        low = integral(lambda x: (mean - x) ** k, below) / mass
        high = integral(lambda x: (x - mean) ** k, above) / mass
        values[k] = (integral(lambda x: x ** k, pieces) / mass, high + (-1) ** k * low, high + low)
    for k, (raw, central, absolute) in values.items():
        for name, value in (("Raw", raw), ("Central", central), ("Absolute", absolute)):
            if fabs(value) > absolute * mpf(10) ** -40 and not (name == "Central" and k == 1):
                print(f"{family},{' '.join(repr(p) for p in parameters)},{k},{name},{nstr(value, DIGITS, strip_zeros=False)}")
    return mass, mean, values


def truncated(m, s, low, high, orders):
    mean, sd = mpf(m), mpf(s)
    # The density falls by exp(-d t - t^2/2) from the end, or mode, that is nearest to the mean; t and d in standard deviations.
    a, b = (mpf(low) - mean) / sd, (mpf(high) - mean) / sd
    mode = max(a, min(b, mpf(0)))
    reach = 2 * mp.dps * log(10) / (fabs(mode) + sqrt(2 * mp.dps * log(10)))
    steps = [mpf(j) / 16 for j in range(-24, 25)]
    points = sorted({max(a, min(b, mode + reach * t)) for t in steps} | {max(a, mode - 2 * reach), min(b, mode + 2 * reach)})
    points = [p for i, p in enumerate(points) if i == 0 or p > points[i - 1]]
    lines = [mean + sd * p for p in points]
    shift = mode * mode / 2
    mass, average, _ = table(
        "truncated", (m, s, low, high), orders, lambda x: exp(shift - ((x - mean) / sd) ** 2 / 2), lines)
    # Tallis 1961: E X = m + s (phi(a) - phi(b)) / (Phi(b) - Phi(a)).
    with mp.workdps(1500):
        top = (erfc(a / sqrt(2)) - erfc(b / sqrt(2))) if a > 0 else (erf(b / sqrt(2)) - erf(a / sqrt(2)))
        closed = mean + sd * (exp(-a * a / 2) - exp(-b * b / 2)) / (sqrt(pi / 2) * top)
    agree(average - mean if fabs(average) > 1e-30 else mpf(0), closed - mean if fabs(average) > 1e-30 else mpf(0))


def half_normal(s, orders):
    scale = mpf(s)
    points = [scale * j for j in range(0, 34)]
    _, _, values = table("half-normal", (s,), orders, lambda x: exp(-(x / scale) ** 2 / 2), points)
    for k in orders:
        agree(values[k][0], scale ** k * mpf(2) ** (mpf(k) / 2) * gamma(mpf(k + 1) / 2) / sqrt(pi))


def log_normal(m, s, orders):
    """In the standard normal variable z, about which the exponential is smooth; in closed form where s is too small for that."""
    mu, sd = mpf(m), mpf(s)
    digits = mp.dps + int(3 * max(orders) * max(0, -log(sd, 10)))
    with mp.workdps(digits):
        mean = exp(mu + sd * sd / 2)
        middle = sd / 2
        last = max(orders)
        points = [mpf(j) for j in range(-24, 25 + int(last * sd))]
        for k in orders:
            raw = exp(k * mu + k * k * sd * sd / 2)
            below = [p for p in points if p < middle] + [middle]
            above = [middle] + [p for p in points if p > middle]
            f = lambda z: (exp(mu + sd * z) - mean) ** k * exp(-z * z / 2)
            with mp.workdps(mp.dps if digits < 200 else digits):
                if digits < 200:
                    high = scaled_quad(f, above) / sqrt(2 * pi)
                    low = scaled_quad(f, below) / sqrt(2 * pi)
                    central, absolute = high + low, high + (-1) ** k * low
                q = exp(sd * sd)
                terms = [(-1) ** (k - j) * binomial(k, j) * q ** (mpf(j * (j - 1)) / 2) for j in range(k + 1)]
                signs = [erf((j - mpf(1) / 2) * sd / sqrt(2)) for j in range(k + 1)]
                sums = mean ** k * sum(terms), mean ** k * sum(t * (g if k % 2 else 1) for t, g in zip(terms, signs))
                if digits < 200:
                    if k > 1:
                        agree(central, sums[0])
                    agree(absolute, sums[1])
                central, absolute = sums
            for name, value in (("Raw", raw), ("Central", central), ("Absolute", absolute)):
                if not (name == "Central" and k == 1):
                    print(f"log-normal,{m!r} {s!r},{k},{name},{nstr(value, DIGITS, strip_zeros=False)}")


def even_exponential(coefficients, orders):
    c = [mpf(x) for x in coefficients]
    p = lambda x: sum(v * x ** (2 * j + 2) for j, v in enumerate(c))
    end = mpf(1)
    while p(end) - max(orders) * log(end) < mp.dps * log(10) + 20 - 2 * min(0, min(p(end * i / 64) for i in range(65))):
        end *= mpf(5) / 4
    points = [end * i / 48 for i in range(49)]
    mass = scaled_quad(lambda x: exp(-p(x)), points)
    for k in orders:
        value = scaled_quad(lambda x: x ** k * exp(-p(x)), points) / mass
        if len(c) == 1:
            agree(value, c[0] ** (-mpf(k) / 2) * gamma(mpf(k + 1) / 2) / sqrt(pi))
        for name in ("Raw", "Central", "Absolute") if k % 2 == 0 else ("Absolute",):
            print(f"even-exponential,{' '.join(repr(x) for x in coefficients)},{k},{name},{nstr(value, DIGITS, strip_zeros=False)}")


if __name__ == "__main__":
    SHORT, LONG = list(range(1, 9)), [1, 2, 3, 4, 7, 12, 25, 40]
    INF = float("inf")
    print("# made by family-moments.py with mpmath; do not edit")
    print("family,parameters,order,list,value")
    for scale in (1.0, 0.1, 3e-5, 250.0):
        half_normal(scale, LONG)
    for m, s in ((0.0, 1.0), (0.1, 0.4), (-3.0, 0.05), (1.0, 2.0), (0.5, 2.0 ** -7), (2.0, 1e-3)):
        log_normal(m, s, [1, 2, 3, 4, 5, 8, 13, 20])
    log_normal(0.25, 2.0 ** -60, [1, 2, 3, 4, 5, 9])
    for m, s, low, high in (
        (0.0, 1.0, -1.0, 2.0), (0.0, 1.0, 8.0, INF), (0.0, 1.0, 30.0, INF), (0.0, 1.0, 8.0, 8.0 + 2.0 ** -10), (0.0, 1.0, -INF, 1.5),
        (1.5, 0.25, 1.0, 3.0), (-2.0, 3.0, 0.1, INF), (0.1, 0.3, -40.0, 0.7), (5.0, 0.1, -INF, 4.0), (0.0, 1.0, -0.5, 0.5),
        (1.1, 0.7, 0.1, 2.1), (100.0, 15.0, 60.0, 120.0), (0.0, 1.0, 36.0, 37.0), (1e-3, 2.5, -2.0, 1e9), (3.0, 0.01, 2.0, 10.0),
        (0.0, 1.0, 1.0, 1.0000000000000002)):
        truncated(m, s, low, high, SHORT + [15, 30])
    for c in ([0.0, 1.0], [-2.0, 0.5], [0.5], [3.7], [1.0, 0.0, 0.1], [-3.0, 0.25, 0.125], [0.1, 0.2, 0.3, 0.4], [1.0, 1e-4], [0.0, 0.0, 2.0], [-20.0, 1.0]):
        even_exponential(c, LONG)
