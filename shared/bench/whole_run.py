"""Whole runs from process start, in turn with the yardstick on the same recording: medians and their ratio.

    ./nightjar bench [RECORDING.nc EVENTS.tsv] [--rounds N]

Without a recording the ready session of demo-data is used. Needs python3 with numpy and scipy.
"""
import argparse
import os
import platform
import resource
import shutil
import statistics
import subprocess
import sys
import tempfile
import time

HERE = os.path.dirname(os.path.abspath(__file__))
HOME = os.path.dirname(os.path.dirname(HERE))


def seconds(command):
    begun = time.perf_counter()
    done = subprocess.run(command, capture_output=True, text=True)
    if done.returncode:
        sys.exit(f"{command[0]} failed: {done.stderr.strip()[-400:]}")
    return time.perf_counter() - begun


def main():
    parser = argparse.ArgumentParser(prog="nightjar bench", description=__doc__.split("\n")[0])
    ready = os.path.join(HOME, "demo-data", "ready", "small")
    parser.add_argument("recording", nargs="?", default=ready + ".nc")
    parser.add_argument("events", nargs="?", default=ready + "_events.tsv")
    parser.add_argument("--rounds", type=int, default=5)
    a = parser.parse_args()
    scratch = tempfile.mkdtemp(prefix="nightjar-bench-")
    try:
        runs = {"nightjar": [], "yardstick": []}
        for k in range(a.rounds + 1):
            out = os.path.join(scratch, f"out{k}")
            plan = os.path.join(HOME, "configs", "whisker-puff.yaml")
            ours = [os.path.join(HOME, "nightjar"), "analyse", "--quiet", "--recording", a.recording]
            ours += ["--events", a.events, "--plan", plan, "--out", out]
            theirs = [sys.executable, os.path.join(HERE, "yardstick.py"), a.recording, a.events]
            pair = seconds(ours), seconds(theirs)
            if k:  # the first round fills the caches (and builds)
                runs["nightjar"].append(pair[0])
                runs["yardstick"].append(pair[1])
            shutil.rmtree(out, ignore_errors=True)
    finally:
        shutil.rmtree(scratch, ignore_errors=True)
    size = os.path.getsize(a.recording) / 1e6
    print(f"{os.path.basename(a.recording)}, {size:.1f} MB, {os.cpu_count()} cores, {platform.machine()}, {a.rounds} rounds")
    for name, times in runs.items():
        print(f"  {name:10s} median {statistics.median(times):8.2f} s   lowest {min(times):8.2f} s")
    ratio = statistics.median(runs["yardstick"]) / statistics.median(runs["nightjar"])
    print(f"  nightjar is {ratio:.2f} times as fast as the yardstick")
    peak = resource.getrusage(resource.RUSAGE_CHILDREN).ru_maxrss / 1024
    print(f"  largest resident memory of any run {peak:.0f} MiB")


if __name__ == "__main__":
    main()
