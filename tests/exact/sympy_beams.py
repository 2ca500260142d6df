"""Beams solved symbolically by sympy's beam module: a second opinion on reactions, moments and deflections.
Reads a list of beams as JSON, writes their answers. x from the left end, forces up and couples counter-clockwise positive
here as there, except that sympy counts loads downwards negative and couples clockwise positive."""
import json
import sys

from sympy import Rational, symbols
from sympy.physics.continuum_mechanics.beam import Beam

x = symbols("x")


def number(value):
    return Rational(str(value))


def solve(case):
    length = number(case["length"])
    beam = Beam(length, number(case["E"]), number(case["I"]))
    unknowns = []
    for place, kind in case["supports"]:
        at = number(place)
        force = symbols(f"R_{len(unknowns)}")
        beam.apply_load(force, at, -1)
        beam.bc_deflection.append((at, 0))
        unknowns.append((place, "force", force))
        if kind == "fixed":
            moment = symbols(f"M_{len(unknowns)}")
            beam.apply_load(moment, at, -2)
            beam.bc_slope.append((at, 0))
            unknowns.append((place, "moment", moment))
    for load in case["loads"]:
        kind, at = load[0], number(load[1])
        if kind == "force":
            beam.apply_load(number(load[2]), at, -1)
        elif kind == "couple":
            beam.apply_load(-number(load[2]), at, -2)
        else:  # a line load, linear from q1 at its beginning to q2 at its end
            end, q1, q2 = (number(v) for v in load[2:5])
            slope = (q2 - q1) / (end - at)
            for order, value in ((0, q1), (1, slope)):
                if value != 0:
                    beam.apply_load(value, at, order)
            if end != length:
                beam.apply_load(-q2, end, 0)
                if slope != 0:
                    beam.apply_load(-slope, end, 1)
    beam.solve_for_reaction_loads(*[u[2] for u in unknowns])
    loads = beam.reaction_loads
    moment, deflection, slope = beam.bending_moment(), beam.deflection(), beam.slope()
    at = [number(place) for place in case["at"]]
    return {
        # sympy's couples are clockwise
        "reactions": [[p, k, float(loads[u]) * (-1 if k == "moment" else 1)] for p, k, u in unknowns],
        "moments": [float(moment.subs(x, place)) for place in at],
        "deflections": [float(deflection.subs(x, place)) for place in at],
        "slopes": [float(slope.subs(x, place)) for place in at],
    }


with open(sys.argv[1], encoding="utf8") as file:
    json.dump([solve(case) for case in json.load(file)], sys.stdout)
