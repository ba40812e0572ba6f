"""Writes companion-rules.csv: anti-Gaussian companions of Gauss rules, to 60 significant digits, by mpmath 1.3.

Usage: python3 companion-rules.py > companion-rules.csv      (some three minutes)

Laurie, "Anti-Gaussian quadrature formulas", Math. Comp. 65 (1996) 739-747: the companion of the Gauss rule G with n nodes is the Gauss
rule with n + 1 nodes of the functional 2 I - G, where I is the integral. This script takes that definition literally: the moments of
2 I - G from those of the weight and from the nodes and weights of G, the Jacobi matrix from the Cholesky factor of their Hankel
matrix, and its eigenvalues; the library under test doubles a coefficient of the recurrence instead.
Moments and G are those of gauss-rules.py. Each rule is computed at two precisions; the results must agree to 70 digits.
"""
import importlib
import sys
from mpmath import mp, mpf, sqrt, pi, gamma, matrix, eigsy, nstr

gauss = importlib.import_module("gauss-rules")

POINTS = (1, 4, 12)
LARGE = {("half-range", 32)}
FAMILIES = {
    name: gauss.FAMILIES[name] for name in (
        "half-range", "quartic", "double-well", "mixture", "symmetric-mixture", "truncated 8 inf", "truncated -1 2", "truncated -2 2",
        "truncated 8 8+2^-10", "generalized-hermite 0.25", "log-normal 0.1 0.4", "log-normal 0 1")
}
FAMILIES["hermite"] = (lambda: lambda k: gamma(mpf(k + 1) / 2) * mpf(2) ** (mpf(k) / 2) / sqrt(pi) if k % 2 == 0 else mpf(0), (), 300)


def companion(moments, n):
    rule = gauss.rule(moments, n)
    m = [2 * moments(k) / moments(0) - sum(w * x ** k for x, w in rule) for k in range(2 * n + 2)]
    size = n + 1
    r = matrix(size, size + 1)
    for i in range(size):
        for j in range(i, size + 1):
            s = m[i + j] - sum(r[k, i] * r[k, j] for k in range(i))
            r[i, j] = sqrt(s) if i == j else s / r[i, i]
    jacobi = matrix(size, size)
    for k in range(size):
        jacobi[k, k] = r[k, k + 1] / r[k, k] - (r[k - 1, k] / r[k - 1, k - 1] if k else 0)
        if k + 1 < size:
            jacobi[k, k + 1] = jacobi[k + 1, k] = r[k + 1, k + 1] / r[k, k]
    with mp.workdps(max(250, mp.dps // 2)):
        values, vectors = eigsy(jacobi)
        pairs = sorted((values[i], vectors[0, i] ** 2) for i in range(size))
    return pairs


def main():
    print("family,points,index,node,weight")
    for name, (family, arguments, digits) in FAMILIES.items():
        for n in POINTS + (32,):
            if n == 32 and (name, n) not in LARGE:
                continue
            results = []
            for dps in (digits, digits + 60):
                mp.dps = dps
                results.append([(gauss.clean(x), w) for x, w in companion(family(*arguments), n)])
            mp.dps = 300
            for (x, w), (y, v) in zip(*results):
                if not (gauss.agree(x, y) and gauss.agree(w, v)):
                    sys.exit(f"{name} {n}: the two precisions disagree: {nstr(x, 30)} {nstr(y, 30)} {nstr(w, 30)} {nstr(v, 30)}")
            for i, (x, w) in enumerate(results[1]):
                print(f"{name},{n},{i},{nstr(x, 60)},{nstr(w, 60)}")
            sys.stdout.flush()


main()
