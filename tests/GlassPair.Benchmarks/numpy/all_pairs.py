"""Figures of every thin pair in contact, in plain numpy on one thread: the work of PairKernel, to compare times and sums.

usage: all_pairs.py TABLE REPETITIONS
TABLE is CSV without a header. Its first row holds the focal length, then the weight of each sample; every further row a glass, by
falling Abbe number: its share in the data floor, its t at the short and at the long end, then its t at each sample.
Prints the best CPU time in seconds, then the sums of RMS, peak to valley, |secondary spectrum| and expected RMS over the solved pairs.
"""

import sys
import time

import numpy as np


def all_pairs(table):
    focal, w = table[0, 0], table[0, 3:]
    floor, short, long_, t = table[1:, 0], table[1:, 1], table[1:, 2], table[1:, 3:]
    c = t - (t @ w)[:, None]
    i, j = np.triu_indices(len(t), 1)

    d = c[j] - c[i]
    with np.errstate(divide="ignore", invalid="ignore"):
        p1 = ((c[j] * d) @ w) / ((d * d) @ w)
    p1[~(np.abs(p1) <= 1e4)] = np.nan
    p2 = 1.0 - p1

    def shift(ti, tj):
        s = p1[:, None] * ti + p2[:, None] * tj
        return -focal * s / (1.0 + s)

    shifts = shift(t[i], t[j])
    mean = shifts @ w
    rms = np.sqrt(((shifts - mean[:, None]) ** 2) @ w)
    valley = shifts.max(axis=1) - shifts.min(axis=1)
    ends = shift(short[i][:, None], short[j][:, None]) + shift(long_[i][:, None], long_[j][:, None])
    secondary = np.abs(-0.5 * ends[:, 0])
    expected = np.sqrt(rms**2 + focal**2 * (p1**2 * floor[i] + p2**2 * floor[j]))
    return rms, valley, secondary, expected


def main():
    table = np.genfromtxt(sys.argv[1], delimiter=",", filling_values=0.0)
    best = float("inf")
    for _ in range(int(sys.argv[2])):
        start = time.process_time()
        figures = all_pairs(table)
        best = min(best, time.process_time() - start)
    print(repr(best), *(repr(float(np.nansum(f))) for f in figures))


main()
