"""Fits the same laws with scipy.optimize.curve_fit: one JSON list of series in, seconds out.

Each line on standard input is {"laws": 3 or 4, "series": [{"times": [...], "values": [...]}]}; the
answer is the seconds that the fits took, with standard errors, AICc and interval.
"""
import json
import math
import sys
import time
import warnings

import numpy
from scipy.optimize import curve_fit
from scipy.special import wrightomega
from scipy.stats import t as student

warnings.simplefilter("ignore")


def zero(t, c0, k):
    return numpy.maximum(c0 - k * t, 0)


def first(t, c0, k):
    return c0 * numpy.exp(-k * t)


def second(t, c0, k):
    return c0 / (1 + k * c0 * t)


def saturating(t, c0, k, big):
    load = big * c0
    return numpy.real(wrightomega(numpy.log(load) + load - k * big * t)) / big


def fit_all(series, laws):
    for one in series:
        t = numpy.asarray(one["times"]) / one["times"][-1]
        c = numpy.asarray(one["values"])
        c = c / c.max()
        n = len(t)
        for law, start in ((zero, (1, 0.8)), (first, (1, 1)), (second, (1, 1)), (saturating, (1, 1.2, 1)))[:laws]:
            try:
                best, covariance = curve_fit(law, t, c, p0=start, maxfev=2000)
            except RuntimeError:
                continue
            rss = float(numpy.sum((c - law(t, *best)) ** 2))
            errors = numpy.sqrt(numpy.diag(covariance))
            count = len(best) + 1
            aicc = n * math.log(rss / n) + 2 * count + 2 * count * (count + 1) / (n - count - 1)
            half = student.ppf(0.975, n - len(best)) * errors[1]
            (aicc, best[1] - half, best[1] + half)


print("ready", flush=True)
for text in sys.stdin:
    work = json.loads(text)
    begin = time.perf_counter()
    fit_all(work["series"], work["laws"])
    print(time.perf_counter() - begin, flush=True)
