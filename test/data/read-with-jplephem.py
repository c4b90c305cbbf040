"""Reads an SPK file with jplephem. Standard input: {"kernel": path, "segments": [[centre, target, [JD, ...]], ...]}.
Standard output: for each segment the list of [x, y, z (km), rates (km a day)] at its dates."""

import json
import sys

import numpy
from jplephem.spk import SPK

asked = json.load(sys.stdin)
kernel = SPK.open(asked["kernel"])
answer = []
for centre, target, dates in asked["segments"]:
    position, velocity = kernel[centre, target].compute_and_differentiate(numpy.array(dates))
    if len(position) == 6:  # type 3: the velocities (km a second) are series of their own
        position, velocity = position[:3], position[3:] * 86400
    answer.append(numpy.vstack([position, velocity]).T.tolist())
json.dump(answer, sys.stdout)
