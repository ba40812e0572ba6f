"""Writes nested-rules.csv: the nested rules of Genz and Keister for the standard normal density, to 60 significant digits, by mpmath 1.3.

Usage: python3 nested-rules.py > nested-rules.csv      (some seconds)

Genz and Keister, "Fully symmetric interpolatory rules for multiple integrals over infinite regions with Gaussian weight",
J. Comput. Appl. Math. 71 (1996) 299-309. Starting from the node 0, the nodes so far are extended by the zeros of the even monic
polynomial E of degree 2, 6, 10, 16 for which the product of E and the node polynomial is orthogonal to all polynomials of lower
degree than E; the weights integrate the interpolating polynomial.

Independent of the library under test in method and in arithmetic: E in powers of x by Gaussian elimination in floating point at
several hundred digits, its zeros by the simultaneous iteration of mpmath's polyroots, the weights from the linear system of the
moment equations. Each rule is computed at two precisions; the results must agree to 70 digits. The degree of exactness is
checked: the moments up to it agree, the next even one does not.
"""
import sys
from mpmath import mp, mpf, matrix, lu_solve, polyroots, fac2, nstr

EXTENSIONS = (2, 6, 10, 16)
DEGREES = (1, 5, 15, 29, 51)


def moment(k):
    return mpf(0) if k % 2 else fac2(k - 1)


def times(p, q):
    r = [mpf(0)] * (len(p) + len(q) - 1)
    for i, a in enumerate(p):
        for j, b in enumerate(q):
            r[i + j] += a * b
    return r


def extension(nodes, degree):
    """Coefficients of E, the constant first: sum over i of e_i times the integral of omega x^(i+j) is zero for all j < degree."""
    omega = [mpf(1)]
    for x in nodes:
        omega = times(omega, [-x, mpf(1)])
    functional = [sum(c * moment(i + k) for i, c in enumerate(omega)) for k in range(2 * degree)]
    system = matrix(degree, degree)
    right = matrix(degree, 1)
    # Rows of one parity say nothing about coefficients of the other one: the even ones come from odd j, and E is even.
    for row in range(degree):
        for i in range(degree):
            system[row, i] = functional[i + row] if (i + row + len(nodes)) % 2 == 0 else mpf(0)
        right[row] = -functional[degree + row] if (degree + row + len(nodes)) % 2 == 0 else mpf(0)
    return [c for c in lu_solve(system, right)] + [mpf(1)]


def weights(nodes):
    n = len(nodes)
    system = matrix(n, n)
    right = matrix(n, 1)
    for k in range(n):
        for i, x in enumerate(nodes):
            system[k, i] = x ** k
        right[k] = moment(k)
    return [w for w in lu_solve(system, right)]


def levels():
    nodes = [mpf(0)]
    yield nodes
    for degree in EXTENSIONS:
        roots = polyroots(list(reversed(extension(nodes, degree))), maxsteps=2000, extraprec=mp.prec)
        assert all(abs(mp.im(r)) < mpf(10) ** -(mp.dps // 3) for r in roots), "E has zeros that are not real"
        nodes = sorted(nodes + [mp.re(r) for r in roots])
        yield nodes


def rules(dps):
    mp.dps = dps
    return [(nodes, weights(nodes)) for nodes in levels()]


def agree(a, b):
    return abs(a - b) <= abs(b) * mpf(10) ** -70 or abs(b) < mpf(10) ** -90


def main():
    first, second = rules(240), rules(300)
    print("level,index,node,weight")
    for level, ((x, w), (y, v)) in enumerate(zip(first, second)):
        for k in range(DEGREES[level] + 2):
            error = abs(sum(b * a ** k for a, b in zip(y, v)) - moment(k)) / fac2(max(k - 1, 1))
            exact = error < mpf(10) ** -90
            if exact != (k <= DEGREES[level] or k % 2 == 1):
                sys.exit(f"level {level}: the error of order {k} is {nstr(error, 10)}")
        for i in range(len(y)):
            if not (agree(x[i], y[i]) and agree(w[i], v[i])):
                sys.exit(f"level {level}: the two precisions disagree: {nstr(x[i], 30)} {nstr(y[i], 30)} {nstr(w[i], 30)} {nstr(v[i], 30)}")
            node = mpf(0) if abs(y[i]) < mpf(10) ** -90 else y[i]
            print(f"{level},{i},{nstr(node, 60)},{nstr(v[i], 60)}")


main()
