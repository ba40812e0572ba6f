"""Writes gauss-rules.csv: Gauss rules of the families of weights, to 60 significant digits, by mpmath 1.3.

Usage: python3 gauss-rules.py > gauss-rules.csv      (some minutes)

Independent of the library under test in method and in arithmetic: moments by closed forms with gamma, incomplete gamma and
exponential functions or by numerical integration, at several hundred digits; the Jacobi matrix from the Cholesky factor of the
moment matrix (Golub and Welsch 1969); nodes and weights from the eigenvalues and eigenvectors of that matrix.
Each rule is computed at two precisions; the results must agree to 70 digits.
"""
import sys
from mpmath import mp, mpf, exp, sqrt, pi, gamma, gammainc, matrix, eigsy, nstr, quad, inf, binomial, linspace, erf, erfc

POINTS = (5, 12, 32)


def half_range():
    return lambda k: mpf(2) ** (mpf(k) / 2) * gamma(mpf(k + 1) / 2) / sqrt(pi)


def generalized_hermite(mu):
    return lambda k: gamma(mpf(mu) + mpf(k + 1) / 2) / gamma(mpf(mu) + mpf(1) / 2) if k % 2 == 0 else mpf(0)


def log_normal(m, s):
    return lambda k: exp(k * mpf(m) + k * k * mpf(s) ** 2 / 2)


def normal_raw(k, m, s):
    return sum(binomial(k, j) * mpf(m) ** (k - j) * mpf(s) ** j * (gamma(mpf(j + 1) / 2) * mpf(2) ** (mpf(j) / 2) / sqrt(pi))
               for j in range(0, k + 1, 2))


def mixture(weights, means, deviations):
    total = sum(map(mpf, weights))
    return lambda k: sum(mpf(w) / total * normal_raw(k, m, s) for w, m, s in zip(weights, means, deviations))


def truncated(lower, upper):
    """Raw moments about a point near the mass, by the incomplete gamma function and the binomial theorem."""
    def half(k, x):  # the integral of t^k exp(-t^2/2) from x >= 0 to infinity
        return mpf(2) ** (mpf(k - 1) / 2) * gammainc(mpf(k + 1) / 2, mpf(x) ** 2 / 2)

    def beyond(k, x):  # the same from any x
        if x >= 0:
            return half(k, x)
        return mpf(2) ** (mpf(k - 1) / 2) * gamma(mpf(k + 1) / 2) + (-1) ** k * (
            mpf(2) ** (mpf(k - 1) / 2) * gamma(mpf(k + 1) / 2) - half(k, -x))

    def moment(k):
        if lower == -inf:
            return (-1) ** k * beyond(k, -upper)
        return beyond(k, lower) - (beyond(k, upper) if upper != inf else 0)

    return moment


def even_exponential(coefficients):
    """The first integrals by quadrature, the others by integration by parts with digits to spare."""
    d = len(coefficients)
    known = {}

    def exponent(x):
        return sum(mpf(c) * x ** (2 * j + 2) for j, c in enumerate(coefficients))

    def start(k):
        end = 1
        while exponent(mpf(end)) < mp.dps * 2.4:
            end += 1
        cuts = [mpf(i) / 2 for i in range(2 * end + 1)]
        return 2 * quad(lambda x: x ** k * exp(-exponent(x)), cuts)

    def moment(k):
        if k % 2:
            return mpf(0)
        key = (mp.dps, k)
        if key not in known:
            if k < 2 * d:
                known[key] = start(k)
            else:
                j = k - 2 * d
                rest = sum(2 * (i + 1) * mpf(c) * moment(j + 2 * i + 2) for i, c in enumerate(coefficients[:-1]) if c)
                known[key] = ((j + 1) * moment(j) - rest) / (2 * d * mpf(coefficients[-1]))
        return known[key]

    return moment


FAMILIES = {
    "half-range": (half_range, (), 500),
    "quartic": (even_exponential, ([0, 1],), 200),
    "double-well": (even_exponential, ([-2, 0.5],), 220),
    "sextic": (even_exponential, ([1, 0, 0.1],), 220),
    "deep-well": (even_exponential, ([-10, 1],), 300),
    "mixture": (mixture, ([0.3, 0.7], [-1, 2], [0.5, 1.5]), 400),
    "symmetric-mixture": (mixture, ([1, 2, 1], [-2, 1, 4], [0.5, 1, 0.5]), 400),
    "far-mixture": (mixture, ([0.9, 0.1], [0, 100], [1, 2]), 600),
    "truncated 8 inf": (truncated, (8, inf), 800),
    "truncated -1 inf": (truncated, (-1, inf), 500),
    "truncated -inf 2": (truncated, (-inf, 2), 500),
    "truncated -1 2": (truncated, (-1, 2), 500),
    "truncated -3 -2.5": (truncated, (-3, -2.5), 700),
    "truncated 36 38": (truncated, (36, 38), 1500),
    "truncated -40 40": (truncated, (-40, 40), 500),
    "truncated -2 2": (truncated, (-2, 2), 500),
    "truncated 0 30": (truncated, (0, 30), 600),
    "truncated 8 8+2^-10": (truncated, (8, 8 + 2.0 ** -10), 1200),
    "truncated -2 8": (truncated, (-2, 8), 600),
    "truncated 8 20": (truncated, (8, 20), 1000),
    "generalized-hermite 0.25": (generalized_hermite, (0.25,), 300),
    "generalized-hermite -0.4375": (generalized_hermite, (-0.4375,), 300),
    "generalized-hermite 20": (generalized_hermite, (20,), 400),
    "log-normal 0.1 0.4": (log_normal, (0.1, 0.4), 400),
    "log-normal -0.5 0.25": (log_normal, (-0.5, 0.25), 600),
    "log-normal 0 1": (log_normal, (0, 1), 400),
}

SKIPPED = {("log-normal 0 1", 32)}  # weights below 2^-1022


def rule(moments, n):
    """Golub and Welsch: R with R^T R = (m_{i+j}), then the recurrence from R, then eigenvalues and first components."""
    m = [moments(k) for k in range(2 * n + 1)]
    size = n + 1
    r = matrix(size, size)
    for i in range(size):
        for j in range(i, size):
            s = m[i + j] - sum(r[k, i] * r[k, j] for k in range(i))
            r[i, j] = sqrt(s) if i == j else s / r[i, i]
    jacobi = matrix(n, n)
    for k in range(n):
        jacobi[k, k] = r[k, k + 1] / r[k, k] - (r[k - 1, k] / r[k - 1, k - 1] if k else 0)
        if k + 1 < n:
            jacobi[k, k + 1] = jacobi[k + 1, k] = r[k + 1, k + 1] / r[k, k]
    # The eigenvalues need fewer digits than the moments did; so many that small weights are right to 70 digits as well.
    with mp.workdps(max(250, mp.dps // 2)):
        values, vectors = eigsy(jacobi)
        pairs = sorted((values[i], vectors[0, i] ** 2) for i in range(n))
    return pairs


def clean(x):
    return mpf(0) if abs(x) < mpf(10) ** -150 else x


def agree(a, b):
    return abs(a - b) <= abs(b) * mpf(10) ** -70


def main():
    print("family,points,index,node,weight")
    for name, (family, arguments, digits) in FAMILIES.items():
        for n in POINTS:
            if (name, n) in SKIPPED:
                continue
            results = []
            for dps in (digits, digits + 60):
                mp.dps = dps
                results.append([(clean(x), w) for x, w in rule(family(*arguments), n)])
            mp.dps = 300
            # Points near the smallest weights decide the digits that are needed; both runs must tell the same.
            for (x, w), (y, v) in zip(*results):
                if not (agree(x, y) and agree(w, v)):
                    sys.exit(f"{name} {n}: the two precisions disagree: {nstr(x, 30)} {nstr(y, 30)} {nstr(w, 30)} {nstr(v, 30)}")
            for i, (x, w) in enumerate(results[1]):
                print(f"{name},{n},{i},{nstr(x, 60)},{nstr(w, 60)}")
            sys.stdout.flush()


if __name__ == "__main__":
    main()
