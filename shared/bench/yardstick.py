"""The same job in plain numpy and scipy, as an analyst would write it: what Nightjar's speed is held against.

    python3 yardstick.py RECORDING.nc EVENTS.tsv [--no-align]

Reads a classic NetCDF recording of one plane, shifts every frame onto the median frame (phase of the cross-spectrum,
refined on a grid of 1/50 voxel [Guizar-Sicairos, Thurman & Fienup 2008, Opt Lett 33:156], cubic spline), scales to
percent, fits gamma-kernel stimuli (mode 2.1 s, width 2.9 s), cosine drift of 120 s and a level with AR(1) noise
whitened by classes of 0.01, tests each stimulus against the mean of the others, adjusts by Benjamini-Hochberg.
"""
import csv
import sys
import time

import numpy as np
from scipy import fft, ndimage, optimize, special, stats
from scipy.io import netcdf_file

FINE = 50


def displacement(reference, image):
    cross = reference * np.conj(fft.fft2(image - image.mean()))
    coarse = np.abs(fft.ifft2(cross))
    peak = np.array(np.unravel_index(coarse.argmax(), coarse.shape))
    size = np.array(image.shape)
    peak = np.where(peak > size // 2, peak - size, peak)
    steps = np.arange(-FINE * 3 // 4, FINE * 3 // 4 + 1) / FINE
    rows = np.exp(2j * np.pi * np.outer(peak[0] + steps, fft.fftfreq(size[0])))
    columns = np.exp(2j * np.pi * np.outer(fft.fftfreq(size[1]), peak[1] + steps))
    fine = np.abs(rows @ cross @ columns)
    z, x = np.unravel_index(fine.argmax(), fine.shape)
    return peak[0] + steps[z], peak[1] + steps[x]


def align(film):
    image = np.log(np.median(film[:: max(1, len(film) // 200)], axis=0))
    reference = fft.fft2(image - image.mean())
    for t, frame in enumerate(film):
        film[t] = ndimage.shift(frame, displacement(reference, np.log(frame)), order=3, mode="nearest")


def brain(mean):
    log = np.log(np.maximum(mean, 1e-6))
    counts, edges = np.histogram(log, 256)
    centres = (edges[1:] + edges[:-1]) / 2
    below, moment = np.cumsum(counts), np.cumsum(counts * centres)
    between = (moment[-1] * below / below[-1] - moment) ** 2 / np.maximum(below * (below[-1] - below), 1)
    return log > centres[between.argmax()]


def columns(times, events):
    def width(shape):
        f = lambda x: (shape - 1) * (np.log(x) - x + 1) + np.log(2)
        return optimize.brentq(f, 1, 60) - optimize.brentq(f, 1e-12, 1)

    shape = optimize.brentq(lambda a: 2.1 * width(a) - 2.9, 1.2, 60)
    kernel = lambda t: special.gammainc(shape, np.maximum(t, 0) * (shape - 1) / 2.1)
    trials = {}
    for row in csv.DictReader(open(events), delimiter="\t"):
        trials.setdefault(row["trial_type"], []).append((float(row["onset"]), float(row["duration"])))
    dt = np.median(np.diff(times))
    start, length = times[0] - dt / 2, times[-1] - times[0] + dt
    stimuli = [sum(kernel(times - o) - kernel(times - o - d) for o, d in trials[n]) for n in sorted(trials)]
    drift = [np.cos(np.pi * k * (times - start) / length) for k in range(1, int(2 * length / 120) + 1)]
    return np.stack(stimuli + drift + [np.ones(len(times))], 1), len(stimuli)


def fit(y, x, contrasts):
    residual = y - x @ np.linalg.lstsq(x, y, rcond=None)[0]
    rho = (residual[1:] * residual[:-1]).sum(0) / (residual**2).sum(0) + x.shape[1] / len(x)
    rho = np.clip(np.round(rho, 2), -0.2, 0.95)
    t = np.empty((len(contrasts), y.shape[1]))
    white = lambda a, r: np.vstack([np.sqrt(1 - r * r) * a[:1], a[1:] - r * a[:-1]])
    for r in np.unique(rho):
        own = rho == r
        wx, wy = white(x, r), white(y[:, own], r)
        beta = np.linalg.lstsq(wx, wy, rcond=None)[0]
        variance = ((wy - wx @ beta) ** 2).sum(0) / (len(x) - x.shape[1])
        unit = np.einsum("ij,jk,ik->i", contrasts, np.linalg.inv(wx.T @ wx), contrasts)
        t[:, own] = (contrasts @ beta) / np.sqrt(variance * unit[:, None])
    return t


def adjusted(p):
    order = np.argsort(p, 1)
    q = np.take_along_axis(p, order, 1) * p.shape[1] / np.arange(1, p.shape[1] + 1)
    return np.minimum.accumulate(q[:, ::-1], 1)[:, ::-1]


def main():
    begun = time.perf_counter()
    with netcdf_file(sys.argv[1], "r", mmap=False) as f:
        film = f.variables["power_doppler"][:]
        scale = getattr(f.variables["power_doppler"], "scale_factor", 1.0)
        film = np.maximum(film.astype(np.float32) * np.float32(scale), 1e-6)
        times = f.variables["time"][:].astype(float)
    if "--no-align" not in sys.argv:
        align(film)
    y = film.reshape(len(film), -1)
    mean = y.mean(0)
    inside = brain(mean)
    y = (100 * (y[:, inside] / mean[inside] - 1)).astype(float)
    x, stimuli = columns(times, sys.argv[2])
    contrasts = np.zeros((stimuli, x.shape[1]))
    contrasts[:, :stimuli] = -1 / max(stimuli - 1, 1)
    np.fill_diagonal(contrasts[:, :stimuli], 1)
    t = fit(y, x, contrasts)
    q = adjusted(2 * stats.t.sf(np.abs(t), len(x) - x.shape[1]))
    print(f"{(q < 0.05).sum()} voxels at q < 0.05, {time.perf_counter() - begun:.2f} s after the imports")


if __name__ == "__main__":
    main()
