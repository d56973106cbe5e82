#!/usr/bin/python3
"""Solves the NIST linear problems in exact rational arithmetic and sets the result beside the certified values of the files.

    /usr/bin/python3 tests/reference/nist_linear.py        (standard library only)

The data are read as decimal fractions, as they stand in the file, and the normal equations solved by elimination in
fractions.Fraction, so nothing is rounded until the result is printed. A line ends in "differs" where a certified number and the
exact one part before the 14th digit: then the file does not carry what the institute certifies. Exit status 1 if any does.
"""
import os
import re
import sys
from decimal import Decimal, getcontext
from fractions import Fraction

FOLDER = os.path.join(os.path.dirname(__file__), "..", "..", "fixtures", "nist", "linear")
DEGREE = {"Norris": 1, "Pontius": 2, "Filip": 10, **{f"Wampler{k}": 5 for k in range(1, 6)}}
getcontext().prec = 60


def read(name):
    lines = open(os.path.join(FOLDER, name + ".dat")).read().splitlines()
    certified = [(Decimal(m[1]), Decimal(m[2])) for m in (re.match(r"\s*B\d+\s+(\S+)\s+(\S+)\s*$", line) for line in lines) if m]
    sums = next(re.match(r"Residual\s+\d+\s+(\S+)", line)[1] for line in lines if re.match(r"Residual\s+\d+\s", line))
    begin = max(i for i, line in enumerate(lines) if line.startswith("Data:")) + 1
    table = [[Fraction(word) for word in line.split()] for line in lines[begin:] if line.strip()]
    return certified, Decimal(sums), table


def row_of(name, x):
    if name in DEGREE:
        return [x[0] ** k for k in range(DEGREE[name] + 1)]
    return ([Fraction(1)] if name == "Longley" else []) + x


def inverse(matrix):
    n = len(matrix)
    work = [list(row) + [Fraction(int(i == j)) for j in range(n)] for i, row in enumerate(matrix)]
    for k in range(n):
        pivot = next(i for i in range(k, n) if work[i][k] != 0)
        work[k], work[pivot] = work[pivot], work[k]
        work[k] = [v / work[k][k] for v in work[k]]
        for i in range(n):
            if i != k and work[i][k] != 0:
                work[i] = [a - work[i][k] * b for a, b in zip(work[i], work[k])]
    return [row[n:] for row in work]


def decimal(q):
    return Decimal(q.numerator) / Decimal(q.denominator)


def solve(name):
    certified, certified_sum, table = read(name)
    y = [row[0] for row in table]
    design = [row_of(name, row[1:]) for row in table]
    n = len(design[0])
    gram = [[sum(r[a] * r[b] for r in design) for b in range(n)] for a in range(n)]
    moment = [sum(r[a] * v for r, v in zip(design, y)) for a in range(n)]
    inverted = inverse(gram)
    values = [sum(i * m for i, m in zip(row, moment)) for row in inverted]
    residual = sum((v - sum(r * b for r, b in zip(row, values))) ** 2 for row, v in zip(design, y))
    variance = residual / (len(y) - n)
    worst = 99.0
    for k, (value, error) in enumerate(certified):
        exact = decimal(values[k])
        deviation = decimal(variance * inverted[k][k]).sqrt()
        digits = min(agreement(exact, value), agreement(deviation, error))
        worst = min(worst, digits)
        print(f"{name} B{k}  {exact:.17e}  {deviation:.17e}  {digits:.1f}{'  differs' if digits < 13.9 else ''}")
    digits = agreement(decimal(residual), certified_sum)
    print(f"{name} residual sum  {decimal(residual):.17e}  {digits:.1f}{'  differs' if digits < 13.9 else ''}")
    return min(worst, digits)


def agreement(found, stated):
    if found == stated:
        return 99.0
    return float(-(abs(found - stated) / (abs(stated) if stated else Decimal(1))).log10())


if __name__ == "__main__":
    names = sorted(f[:-4] for f in os.listdir(FOLDER) if f.endswith(".dat"))
    sys.exit(0 if min([solve(name) for name in names]) >= 13.9 else 1)
