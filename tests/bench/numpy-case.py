"""One timed case of numpy or scipy in a process of its own: prints a line of JSON."""
import json
import os
import resource
import sys
import time

import numpy as np

FACE_AT_MM, REACH_MM = 6.0, 3.0


def header_bytes(path):
    with open(path, "rb") as file:
        return file.read(4096).index(b"end_header\n") + len(b"end_header\n")


def ply(folder):
    path = os.path.join(folder, "cloud.ply")
    return np.fromfile(path, dtype="<f4", offset=header_bytes(path)).reshape(-1, 3)


def csv(folder):
    return np.loadtxt(os.path.join(folder, "cloud.csv"), delimiter=",", skiprows=1)


def planes(folder):
    """A tree over the points, then at each station one plane a plate through the points about a place on it."""
    from scipy.spatial import cKDTree

    points = ply(folder).astype(float)
    with open(os.path.join(folder, "model.json")) as file:
        vertices = json.load(file)["seam"]["vertices"]
    frames = [{key: np.array(v[key]) for key in ("point", "lateral", "normal")} for v in vertices]
    start = time.perf_counter()
    tree = cKDTree(points)
    fitted = 0
    for frame in frames:
        for middle in (frame["point"] - FACE_AT_MM * frame["lateral"], frame["point"] + FACE_AT_MM * frame["normal"]):
            near = points[tree.query_ball_point(middle, REACH_MM)]
            if len(near) < 8:
                continue
            off = near - near.mean(axis=0)
            np.linalg.eigh(off.T @ off)
            fitted += 1
    return {"cold_ms": 1e3 * (time.perf_counter() - start), "stations": len(frames), "planes": fitted}


def timed(step, folder):
    start = time.perf_counter()
    count = len(step(folder))
    return {"cold_ms": 1e3 * (time.perf_counter() - start), "points": count}


what, folder = sys.argv[1:3]
result = planes(folder) if what == "planes" else timed({"csv": csv, "ply": ply}[what], folder)
print(json.dumps({**result, "peak_mb": resource.getrusage(resource.RUSAGE_SELF).ru_maxrss / 1024}))
