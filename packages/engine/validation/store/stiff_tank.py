"""Layer temperatures of a stratified tank by scipy's stiff solver: the reference for the engine's tank.

Reads a case as JSON on standard input and writes the temperatures at each full hour as JSON. The equations are
the same (equal masses, net upwind exchange, conduction, shell loss, mixing valve); the integration is not:
backward differentiation with error control, and layers under colder ones are mixed by a
strong exchange flow instead of being merged.

Runs on Debian's python3-scipy.
"""

import json
import os
import sys

# Ten unknowns need no threads, which would only wait for each other on a busy machine.
os.environ["OPENBLAS_NUM_THREADS"] = "1"

import numpy as np
import scipy
from scipy.integrate import solve_ivp

# Exchange between a layer and a colder one above it [kg/s]: thousands of times any flow of the cases, so that
# what is left of an inversion is some thousandths of a kelvin.
MIXING_KG_S = 2000.0


def main():
    case = json.load(sys.stdin)
    hourly = run(case)
    json.dump({"scipy": scipy.__version__, "hourlyC": hourly}, sys.stdout)


def run(case):
    water = Water(case["meanHeatCapacity"])
    tank = case["tank"]
    layers = tank["layers"]
    layer_kg = case["massKg"] / layers
    h = np.full(layers, water.enthalpy(case["initialC"]))
    result = []
    # A matching inlet is chosen anew for each step; a fixed one lets the solver run through the hour.
    step_s = case["stepS"] if tank["chargeInlet"]["kind"] == "matchingLayer" else 3600
    for hour in range(24):
        conditions = {key: case[key][hour] for key in ("chargeFlowKgS", "chargeEnthalpyRiseJkg", "loadFlowKgS")}
        for _ in range(round(3600 / step_s)):
            shares = inlet_shares(tank["chargeInlet"], h, conditions["chargeEnthalpyRiseJkg"])
            derivative = make_derivative(case, conditions, shares, layer_kg, water)
            solution = solve_ivp(derivative, (0, step_s), h, method="BDF", rtol=1e-8, atol=1e-2)
            # Looser than this the solver chatters at the mixing's kink and is off by 0.05 K itself.
            if not solution.success:
                raise RuntimeError(solution.message)
            h = solution.y[:, -1]
        result.append([round(float(t), 5) for t in water.temperature(h)])
    return result


def inlet_shares(inlet, h, rise):
    """Share of the charged stream that enters each layer."""
    layers = len(h)
    shares = np.zeros(layers)
    if inlet["kind"] == "fixedHeight":
        shares[min(layers - 1, int(inlet["heightFraction"] * layers))] = 1
        return shares
    # The layers are in order to within the mixing's rest; order them fully for the look-up.
    ordered = np.maximum.accumulate(h)
    stream = h[0] + rise
    below = max(0, int(np.searchsorted(ordered, stream, side="right")) - 1)
    if below == layers - 1 or stream <= ordered[below]:
        shares[below] = 1
    else:
        above = (stream - ordered[below]) / (ordered[below + 1] - ordered[below])
        shares[below] = 1 - above
        shares[below + 1] = above
    return shares


def make_derivative(case, conditions, shares, layer_kg, water):
    tank = case["tank"]
    layers = tank["layers"]
    area = tank["volumeM3"] / tank["heightM"]
    conduction = tank["effectiveConductivityWmK"] * area / (tank["heightM"] / layers)
    side = np.pi * np.sqrt(4 * area / np.pi) * tank["heightM"]
    loss = np.full(layers, tank["lossUaWK"] * side / (side + 2 * area) / layers)
    loss[0] += tank["lossUaWK"] * area / (side + 2 * area)
    loss[-1] += tank["lossUaWK"] * area / (side + 2 * area)
    charge = conditions["chargeFlowKgS"]
    load = conditions["loadFlowKgS"]
    rise = conditions["chargeEnthalpyRiseJkg"]
    h_mains = water.enthalpy(case["mainsC"])
    h_set = water.enthalpy(case["setPointC"])
    # Charge that passes down from layer i + 1 to layer i: all that entered above i.
    down = charge * (np.cumsum(shares[::-1])[::-1][1:])

    def derivative(_time, h):
        need = h_set - h_mains
        warmth = h[-1] - h_mains
        through = load * (need / warmth if warmth > need else 1.0)
        net = through - down
        t = water.temperature(h)
        up = np.where(net > 0, net * h[:-1], net * h[1:])
        up = up + conduction * (t[:-1] - t[1:])
        up = up + MIXING_KG_S * np.maximum(0, h[:-1] - h[1:])
        power = charge * shares * (h[0] + rise) - loss * (t - tank["surroundings"]["temperatureC"])
        power[:-1] -= up
        power[1:] += up
        power[0] += through * h_mains - charge * h[0]
        power[-1] -= through * h[-1]
        return power / layer_kg

    return derivative


class Water:
    """Enthalpy of water as the engine fits it: t times a polynomial in (t - 100)/100; inverse by Newton."""

    def __init__(self, mean_heat_capacity):
        mean = np.polynomial.Polynomial(mean_heat_capacity)
        x = np.polynomial.Polynomial([-1, 0.01])
        self.polynomial = np.polynomial.Polynomial([0, 1]) * mean(x)
        self.slope = self.polynomial.deriv()

    def enthalpy(self, t):
        return self.polynomial(t)

    def temperature(self, h):
        t = h / 4190
        for _ in range(6):
            t = t - (self.polynomial(t) - h) / self.slope(t)
        return t


if __name__ == "__main__":
    main()
