"""Area before, after and net new on each receptor by GEOS; suns as JSON in, areas and times out."""

import json
import sys
import time

import shapely.geos
from shapely.geometry import MultiPolygon, Polygon
from shapely.ops import unary_union


def polygon(rings):
    return Polygon(rings[0], rings[1:])


def task(given):
    shadows = {
        role: [MultiPolygon([polygon(rings) for rings in one]) for one in given["shadows"][role]]
        for role in ("context", "existing", "proposed")
    }
    return polygon(given["receptor"]), shadows


def areas(receptor, shadows):
    before = receptor.difference(unary_union(shadows["context"] + shadows["existing"]))
    after = receptor.difference(unary_union(shadows["context"] + shadows["proposed"]))
    return before.area, after.area, before.difference(after).area


suns = [[task(given) for given in sun] for sun in json.load(sys.stdin)]
times, results = [], []
for sun in suns:
    started = time.perf_counter()
    results.append([areas(*one) for one in sun])
    times.append(1000 * (time.perf_counter() - started))
json.dump(
    {
        "version": ".".join(str(part) for part in shapely.geos.geos_version),
        "milliseconds": times,
        "areas": results,
    },
    sys.stdout,
)
