"""Writes the netCDF-4 recordings that the tests read.

    python3 make_netcdf4.py FOLDER

Needs numpy and netCDF4 (written with netCDF4 1.6.2 over the netCDF C library 4.9.0 and HDF5
1.10.8): another implementation than the one that reads them. Every stored value follows from a
formula that the tests repeat: stored(t, p, z, x) = 1000 p + 100 z + 10 x + t.
"""

import os
import sys

import numpy as np
from netCDF4 import Dataset

FRAMES, PLANES, DEPTHS, LATERALS = 24, 2, 5, 3


def stored(planes=0):
    t, p, z, x = np.ogrid[:FRAMES, : max(planes, 1), :DEPTHS, :LATERALS]
    values = 1000.0 * p + 100.0 * z + 10.0 * x + t
    return values if planes else values[:, 0]


def axis(f, name, values, units, kind="f8"):
    v = f.createVariable(name, kind, (name,))
    v[:] = np.asarray(values)
    v.units = units


def space(f, planes=0):
    if planes:
        f.createDimension("plane", planes)
        axis(f, "plane", np.arange(planes) * 0.4, "mm")
    f.createDimension("depth", DEPTHS)
    f.createDimension("lateral", LATERALS)
    axis(f, "depth", 1 + 0.1 * np.arange(DEPTHS), "mm")
    axis(f, "lateral", 0.2 * np.arange(LATERALS) - 0.2, "mm")


def chunked_deflate(path):
    """int16, chunks of 7 x 2 x 2 that do not divide the shape, deflate and shuffle, packed."""
    with Dataset(path, "w", format="NETCDF4") as f:
        f.animal = "R1"
        f.createDimension("time", FRAMES)
        axis(f, "time", 200 + 400 * np.arange(FRAMES), "ms", "i8")
        space(f)
        v = f.createVariable(
            "power_doppler", "i2", ("time", "depth", "lateral"), zlib=True, shuffle=True,
            chunksizes=(7, 2, 2), fill_value=-9)
        v.set_auto_maskandscale(False)
        v.scale_factor = 0.5
        v.add_offset = 2.0
        values = stored().astype(np.int16)
        values[3, 0, 0] = -9
        v[:] = values
        roi = f.createVariable("roi", "i8", ("depth", "lateral"))
        labels = np.zeros((DEPTHS, LATERALS))
        labels[1, :2] = 1
        labels[3, 2] = 7
        roi[:] = labels
        roi.flag_values = np.array([1, 7], np.int64)
        roi.flag_meanings = "barrel_left barrel_right"


def contiguous_float(path):
    """float32 in one piece, two planes, one NaN."""
    with Dataset(path, "w", format="NETCDF4") as f:
        f.createDimension("time", FRAMES)
        axis(f, "time", 0.2 + 0.4 * np.arange(FRAMES), "s")
        space(f, PLANES)
        v = f.createVariable(
            "power_doppler", "f4", ("time", "plane", "depth", "lateral"), contiguous=True)
        values = stored(PLANES)
        values[7, 1, 2, 2] = np.nan
        v[:] = values


def unlimited_unsigned(path):
    """uint16 with unlimited time in chunks of one frame; frame 5 was never written."""
    with Dataset(path, "w", format="NETCDF4") as f:
        f.createDimension("time", None)
        axis(f, "time", 0.2 + 0.4 * np.arange(FRAMES), "s")
        space(f)
        v = f.createVariable(
            "power_doppler", "u2", ("time", "depth", "lateral"), zlib=True,
            chunksizes=(1, DEPTHS, LATERALS))
        v.set_auto_maskandscale(False)
        values = (60000 + stored()).astype(np.uint16)
        v[:5] = values[:5]
        v[6:] = values[6:]


if __name__ == "__main__":
    folder = sys.argv[1]
    for make in (chunked_deflate, contiguous_float, unlimited_unsigned):
        make(os.path.join(folder, make.__name__ + ".nc"))
