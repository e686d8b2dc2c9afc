"""Second witness of the statistics: general-purpose libraries of Debian. Cases as JSON on stdin, answers as JSON on stdout."""

import json
import sys

import numpy as np
from scipy import linalg, optimize, signal, spatial, special, stats
from sklearn import metrics


def pairs(observed, simulated):
    o, s = np.array(observed), np.array(simulated)
    line = stats.linregress(o, s)
    epsilon = o.mean() / 100
    return {
        "nse": metrics.r2_score(o, s),
        "rmse": np.sqrt(metrics.mean_squared_error(o, s)),
        "mae": metrics.mean_absolute_error(o, s),
        "rsr": np.sqrt(metrics.mean_squared_error(o, s)) / o.std(),
        "pbias": 100 * np.sum(o - s) / np.sum(o),
        "r": stats.pearsonr(o, s)[0],
        "r2": stats.pearsonr(o, s)[0] ** 2,
        "gradient": line.slope,
        "intercept": line.intercept,
        "alpha": s.std() / o.std(),
        "beta": s.mean() / o.mean(),
        "gamma": stats.variation(s) / stats.variation(o),
        "log_nse": metrics.r2_score(np.log(o + epsilon), np.log(s + epsilon)),
    }


def peaks(values, height, distance):
    return signal.find_peaks(np.array(values), height=height, distance=distance)[0].tolist()


def record(times, values):
    t, x = np.array(times), np.array(values)
    n = len(x)
    slope, intercept, low, high = stats.theilslopes(x, t, 0.95)
    signs = np.sign(x[None, :] - x[:, None])
    u = 2 * np.cumsum(stats.rankdata(x))[:-1] - np.arange(1, n) * (n + 1)
    return {
        "slope": slope,
        "intercept": intercept,
        "low": low,
        "high": high,
        "s": float(np.triu(signs, 1).sum()),
        "tau": stats.kendalltau(t, x).statistic,
        "ranks": stats.rankdata(x).tolist(),
        "k": float(np.abs(u).max()),
        "before": int(np.abs(u).argmax()) + 1,
    }


def samples(a, b):
    distance = stats.ks_2samp(a, b).statistic
    n, m = len(a), len(b)
    return {
        "distance": distance,
        "limit": special.kolmogorov(distance * np.sqrt(n * m / (n + m))),
        "exact": stats.ks_2samp(a, b, method="exact").pvalue,
    }


def tails(z, t, degrees, x):
    return {
        "normal": 2 * stats.norm.sf(abs(z)),
        "student": 2 * stats.t.sf(abs(t), degrees),
        "chi_square": stats.chi2.sf(x, degrees),
        "chi_square_limit": stats.chi2.isf(0.025, degrees),
    }


def quantiles(values, probability):
    return {
        "type6": stats.mstats.mquantiles(values, [probability], alphap=0, betap=0)[0],
        "type7": np.quantile(values, probability),
    }


def joint(sample, point):
    x, p = np.array(sample), np.array(point)
    inverse = linalg.inv(np.atleast_2d(np.cov(x, rowvar=False)))
    rows = len(x)
    # Inside when some mixture of the rows is the point.
    mixture = optimize.linprog(
        np.zeros(rows), A_eq=np.vstack([x.T, np.ones(rows)]), b_eq=np.append(p, 1), bounds=(0, None)
    )
    return {
        "distance": spatial.distance.mahalanobis(p, x.mean(axis=0), inverse),
        "inside": bool(mixture.status == 0),
    }


def two_means(a, b):
    f, p = stats.f_oneway(a, b)
    return {"f": f, "p": p}


cases = json.load(sys.stdin)
print(json.dumps([globals()[name](**given) for name, given in cases], default=float))
