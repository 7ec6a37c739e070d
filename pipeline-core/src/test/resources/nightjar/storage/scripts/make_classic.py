"""Writes the classic (CDF-1) and 64-bit offset (CDF-2) recordings that the tests read.

    python3 make_classic.py FOLDER

Needs numpy and scipy (written with scipy 1.17, scipy.io.netcdf_file): an implementation of the
format that shares no code with ours. Every stored value follows from a formula that the tests
repeat: stored(t, p, z, x) = 1000 p + 100 z + 10 x + t.
"""

import os
import sys

import numpy as np
from scipy.io import netcdf_file

FRAMES, PLANES, DEPTHS, LATERALS = 24, 2, 5, 3


def stored(planes=0):
    t, p, z, x = np.ogrid[:FRAMES, : max(planes, 1), :DEPTHS, :LATERALS]
    values = 1000.0 * p + 100.0 * z + 10.0 * x + t
    return values if planes else values[:, 0]


def axis(f, name, values, units, kind="d"):
    v = f.createVariable(name, kind, (name,))
    v[:] = np.asarray(values)
    v.units = units
    return v


def space(f, scale=1.0, units="mm", kind="d", planes=0):
    if planes:
        f.createDimension("plane", planes)
        axis(f, "plane", np.arange(planes) * 0.4 * scale, units, kind)
    f.createDimension("depth", DEPTHS)
    f.createDimension("lateral", LATERALS)
    axis(f, "depth", (1 + 0.1 * np.arange(DEPTHS)) * scale, units, kind)
    axis(f, "lateral", (0.2 * np.arange(LATERALS) - 0.2) * scale, units, kind)


def plain_float(path):
    """CDF-1, float32, labels, mask, global attributes."""
    with netcdf_file(path, "w", version=1) as f:
        f.title = "a plain recording"
        f.animal = "R1"
        f.acquired = "2026-03-01T21:40:00Z"
        f.probe_frequency_mhz = np.float32(15.6)
        f.ensemble_duration_s = 0.25
        f.createDimension("time", FRAMES)
        axis(f, "time", 0.2 + 0.4 * np.arange(FRAMES), "s")
        space(f)
        v = f.createVariable("power_doppler", "f", ("time", "depth", "lateral"))
        v[:] = stored()
        roi = np.zeros((DEPTHS, LATERALS), np.int8)
        roi[1, :2] = 1
        roi[3, 2] = 7
        v = f.createVariable("roi", "b", ("depth", "lateral"))
        v[:] = roi
        v.flag_values = np.array([1, 7, 9], np.int8)
        v.flag_meanings = "barrel_left barrel_right thalamus"
        v = f.createVariable("brain_mask", "b", ("depth", "lateral"))
        v[:] = (np.arange(DEPTHS) > 0)[:, None] * np.ones(LATERALS)


def packed_short(path):
    """CDF-2, int16 with scale, offset, fill value, missing value and valid range."""
    with netcdf_file(path, "w", version=2) as f:
        f.createDimension("time", FRAMES)
        axis(f, "time", 200 + 400 * np.arange(FRAMES), "ms", "i")
        space(f, 1000.0, "um", "f")
        v = f.createVariable("power_doppler", "h", ("time", "depth", "lateral"))
        values = stored().astype(np.int16)
        values[3, 0, 0] = -9  # _FillValue
        values[4, 0, 1] = -8  # missing_value
        values[5, 1, 1] = 600  # above valid_max
        v[:] = values
        v.scale_factor = 0.5
        v.add_offset = 2.0
        v._FillValue = np.int16(-9)
        v.missing_value = np.int16(-8)
        v.valid_max = np.int16(599)


def records(path):
    """CDF-2, time unlimited: int16 rows of 30 bytes, padded to 32, in turn with time and a byte."""
    with netcdf_file(path, "w", version=2) as f:
        f.createDimension("time", None)
        t = f.createVariable("time", "d", ("time",))
        t.units = "seconds since 2026-03-01 21:40:00"
        flag = f.createVariable("shutter", "b", ("time",))
        space(f)
        v = f.createVariable("doppler", "h", ("time", "depth", "lateral"))
        t[:] = 0.2 + 0.4 * np.arange(FRAMES)
        flag[:] = np.arange(FRAMES, dtype=np.int8)
        v[:] = stored().astype(np.int16)


def one_record_variable(path):
    """CDF-1, time unlimited and in one variable only: rows of 30 bytes without padding."""
    with netcdf_file(path, "w", version=1) as f:
        f.frame_interval_s = 0.4
        f.createDimension("time", None)
        space(f, 0.001, "m")
        v = f.createVariable("power_doppler", "h", ("time", "depth", "lateral"))
        v[:] = stored().astype(np.int16)


def planes_double(path):
    """CDF-2, float64, two planes with acquisition times, labels in both."""
    with netcdf_file(path, "w", version=2) as f:
        f.createDimension("time", FRAMES)
        axis(f, "time", 0.2 + 0.4 * np.arange(FRAMES), "s")
        space(f, planes=PLANES)
        v = f.createVariable("plane_time_offset", "d", ("plane",))
        v[:] = [-100.0, 100.0]
        v.units = "ms"
        v = f.createVariable("power_doppler", "d", ("time", "plane", "depth", "lateral"))
        values = stored(PLANES)
        values[7, 1, 2, 2] = np.nan
        v[:] = values
        roi = np.zeros((PLANES, DEPTHS, LATERALS), np.int16)
        roi[1, 4] = 300
        v = f.createVariable("roi", "h", ("plane", "depth", "lateral"))
        v[:] = roi
        v.flag_values = np.array([300], np.int16)
        v.flag_meanings = "thalamus"


def packed_int(path):
    """CDF-1, int32 beyond the precision of float32 before it is unpacked."""
    with netcdf_file(path, "w", version=1) as f:
        f.createDimension("time", FRAMES)
        axis(f, "time", 0.2 + 0.4 * np.arange(FRAMES), "s")
        space(f)
        v = f.createVariable("power_doppler", "i", ("time", "depth", "lateral"))
        v[:] = (1_000_000_000 + stored()).astype(np.int32)
        v.add_offset = -1e9


if __name__ == "__main__":
    folder = sys.argv[1]
    for make in (plain_float, packed_short, records, one_record_variable, planes_double, packed_int):
        make(os.path.join(folder, make.__name__ + ".nc"))
