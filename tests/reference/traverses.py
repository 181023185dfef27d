"""Whole traverses calculated outside the project, with nothing but Python's standard library.

    python3 tests/reference/traverses.py > tests/reference/traverses.json

Written from the sources, independent of the engine: US Standard Atmosphere 1976; saturation pressure of Hyland and
Wexler and the ideal humid-air mixture of the ASHRAE Handbook, Fundamentals 2017, chapter 1 (R_da = 287.042 J/kg K);
plane geometry; V = C sqrt(2 p / rho); unit factors of NIST SP 811.
"""
import json
import math

IN, FT, LB = 0.0254, 0.3048, 0.45359237
INWG = 1000 * 9.80665 * 0.0254
LENGTH = {"in": IN, "ft": FT, "mm": 1e-3, "cm": 1e-2, "m": 1.0}
PRESSURE = {"in_wg": INWG, "Pa": 1.0, "kPa": 1e3, "hPa": 1e2, "mbar": 1e2, "inHg": 13595.1 * 9.80665 * 0.0254, "psi": LB * 9.80665 / IN**2}
VELOCITY = {"ft/min": FT / 60, "m/s": 1.0}
DENSITY = {"lb/ft3": LB / FT**3, "kg/m3": 1.0}


def kelvin(q):
    return {"degF": (q["value"] - 32) / 1.8 + 273.15, "degC": q["value"] + 273.15, "K": q["value"]}[q["unit"]]


def si(q, table):
    return q["value"] * table[q["unit"]]


def standard_pressure(z):
    h = 6356766.0 * z / (6356766.0 + z)
    return 101325.0 * (288.15 / (288.15 - 0.0065 * h)) ** (-9.80665 * 0.0289644 / (8.31432 * 0.0065))


def saturation(T):
    if T <= 273.16:
        c = (-5.6745359e3, 6.3925247, -9.677843e-3, 6.2215701e-7, 2.0747825e-9, -9.484024e-13, 4.1635019)
        return math.exp(c[0] / T + c[1] + c[2] * T + c[3] * T**2 + c[4] * T**3 + c[5] * T**4 + c[6] * math.log(T))
    c = (-5.8002206e3, 1.3914993, -4.8640239e-2, 4.1764768e-5, -1.4452093e-8, 6.5459673)
    return math.exp(c[0] / T + c[1] + c[2] * T + c[3] * T**2 + c[4] * T**3 + c[5] * math.log(T))


def ratio_at(vapour, p):
    return 0.621945 * vapour / (p - vapour)


def density_of(air):
    if "density" in air:
        return si(air["density"], DENSITY), 101325.0
    T = kelvin(air["dryBulb"])
    if "barometricPressure" in air:
        p = si(air["barometricPressure"], PRESSURE)
    else:
        p = standard_pressure(si(air["altitude"], LENGTH) if "altitude" in air else 0.0)
    if "ductStaticPressure" in air:
        p += si(air["ductStaticPressure"], PRESSURE)
    W = 0.0
    if "relativeHumidity" in air:
        W = ratio_at(air["relativeHumidity"]["value"] / 100 * saturation(T), p)
    elif "dewPoint" in air:
        W = ratio_at(saturation(kelvin(air["dewPoint"])), p)
    elif "humidityRatio" in air:
        W = air["humidityRatio"]
    elif "wetBulb" in air:
        t, w = T - 273.15, kelvin(air["wetBulb"]) - 273.15
        Ws = ratio_at(saturation(w + 273.15), p)
        if w >= 0:
            W = ((2501 - 2.326 * w) * Ws - 1.006 * (t - w)) / (2501 + 1.86 * t - 4.186 * w)
        else:
            W = ((2830 - 0.24 * w) * Ws - 1.006 * (t - w)) / (2830 + 1.86 * t - 2.1 * w)
    return p * (1 + W) / (287.042 * T * (1 + 1.607858 * W)), p


def area_of(duct):
    wall = duct.get("wall", {})
    off = 2 * sum(si(wall[k], LENGTH) for k in ("thickness", "lining") if k in wall) if duct["measured"] == "outside" else 0.0
    d = {k: si(v, LENGTH) - off for k, v in duct.items() if isinstance(v, dict) and k != "wall"}
    if duct["shape"] == "rectangular":
        return d["width"] * d["height"]
    if duct["shape"] == "round":
        return math.pi * (d["diameter"] / 2) ** 2
    a, b = d["major"], d["minor"]
    return math.pi * (b / 2) ** 2 + b * (a - b)


def solve(case):
    rho, p = density_of(case["air"])
    readings, instrument = case["readings"], case.get("instrument")
    calibration = (instrument or {}).get("calibration", {})
    total = count = 0
    for i, line in enumerate(readings["lines"]):
        for j, r in enumerate(line):
            if r is None:
                continue
            r = calibration.get("gain", 1.0) * r + calibration.get("offset", 0.0)
            weight = readings["weights"][i][j] if "weights" in readings else 1
            if readings["kind"] == "velocity_pressure":
                dp = max(0.0, r * PRESSURE[readings["unit"]])
                v = case.get("probe", {}).get("coefficient", 1.0) * math.sqrt(2 * dp / rho)
                x = dp / p
                eps = math.sqrt(1 - x / 2.8 + 0.4 / (6 * 1.96) * x * x)
                if 1 - eps > 0.0005:
                    v *= eps
            else:
                v = r * VELOCITY[readings["unit"]]
                if instrument:
                    r0 = si(instrument["assumedDensity"], DENSITY) if "assumedDensity" in instrument else case["standard"]
                    v *= {"differential_pressure": math.sqrt(r0 / rho), "thermal": r0 / rho, "rotating_vane": 1.0}[instrument["principle"]]
            total += weight * v
            count += weight
    q = area_of(case["duct"]) * total / count
    return {"density": rho, "averageVelocity": total / count, "actual": q, "mass": rho * q, "standard": rho * q / case["standard"]}


def q(value, unit):
    return {"value": value, "unit": unit}


STANDARD = {
    "ashrae": 0.075 * LB / FT**3,
    "iso": 1.2,
    "epa": 29.92 * PRESSURE["inHg"] / (287.042 * 293.15),
    "normal": 101325 / (287.042 * 273.15),
}
VP25 = [[0.061, 0.074, 0.078, 0.073, 0.06], [0.071, 0.088, 0.092, 0.086, 0.07], [0.075, 0.091, 0.095, 0.09, 0.073], [0.07, 0.087, 0.091, 0.087, 0.071], [0.06, 0.073, 0.077, 0.074, 0.062]]
V12 = [[812, 934, 1010, 1004, 921, 806], [798, 926, 1013, 1009, 930, 811]]
PA20 = [[31.2, 40.1, 44.8, 47.0, 51.3, 50.9, 46.6, 44.1, 39.2, 30.4], [29.8, 39.5, 45.2, 46.1, 52.0, 51.1, 47.3, 43.9, 40.6, 31.5]]
MS9 = [[4.1, 4.9, 4.2], [4.4, 5.3, 4.5], [4.0, 4.8, 4.3]]

CASES = [
    {"title": "lined rectangular, velocity pressure, 1,640 ft, ip", "units": "ip", "duct": {"shape": "rectangular", "measured": "outside", "width": q(26, "in"), "height": q(18, "in"), "wall": {"lining": q(1, "in")}},
     "readings": {"kind": "velocity_pressure", "unit": "in_wg", "lines": VP25}, "air": {"dryBulb": q(58, "degF"), "relativeHumidity": q(85, "percent"), "altitude": q(1640, "ft"), "ductStaticPressure": q(1.2, "in_wg")}},
    {"title": "rectangular inside, velocity pressure, sea level assumed, ip", "units": "ip", "duct": {"shape": "rectangular", "measured": "inside", "width": q(24, "in"), "height": q(16, "in")},
     "readings": {"kind": "velocity_pressure", "unit": "in_wg", "lines": VP25}, "air": {"dryBulb": q(70, "degF")}},
    {"title": "round, indicated velocity of a vane, ip", "units": "ip", "duct": {"shape": "round", "measured": "inside", "diameter": q(14, "in")},
     "readings": {"kind": "velocity", "unit": "ft/min", "lines": V12}, "instrument": {"principle": "rotating_vane"}, "air": {"dryBulb": q(74, "degF"), "wetBulb": q(62, "degF"), "altitude": q(1640, "ft")}},
    {"title": "round, board and lining, velocity pressure in Pa, si", "units": "si", "duct": {"shape": "round", "measured": "outside", "diameter": q(560, "mm"), "wall": {"thickness": q(2, "mm"), "lining": q(28, "mm")}},
     "readings": {"kind": "velocity_pressure", "unit": "Pa", "lines": PA20}, "air": {"dryBulb": q(14, "degC"), "dewPoint": q(11.5, "degC"), "barometricPressure": q(95.6, "kPa"), "ductStaticPressure": q(-310, "Pa")}},
    {"title": "flat oval, velocity pressure, 5,000 ft, ip", "units": "ip", "duct": {"shape": "flat_oval", "measured": "inside", "major": q(36, "in"), "minor": q(14, "in")},
     "readings": {"kind": "velocity_pressure", "unit": "in_wg", "lines": VP25}, "air": {"dryBulb": q(55, "degF"), "relativeHumidity": q(90, "percent"), "altitude": q(5000, "ft")}},
    {"title": "flat oval outside, lined, thermal instrument, si", "units": "si", "duct": {"shape": "flat_oval", "measured": "outside", "major": q(950, "mm"), "minor": q(400, "mm"), "wall": {"lining": q(25, "mm")}},
     "readings": {"kind": "velocity", "unit": "m/s", "lines": MS9}, "instrument": {"principle": "thermal"}, "air": {"dryBulb": q(26, "degC"), "humidityRatio": 0.011, "altitude": q(1800, "m")}},
    {"title": "rectangular, differential pressure instrument that assumed 0.075, 7,500 ft, ip", "units": "ip", "duct": {"shape": "rectangular", "measured": "inside", "width": q(30, "in"), "height": q(12, "in")},
     "readings": {"kind": "velocity", "unit": "ft/min", "lines": V12}, "instrument": {"principle": "differential_pressure", "assumedDensity": q(0.075, "lb/ft3")}, "air": {"dryBulb": q(62, "degF"), "relativeHumidity": q(40, "percent"), "altitude": q(7500, "ft")}},
    {"title": "hot stack, S-type probe, known density, si", "units": "si", "duct": {"shape": "round", "measured": "inside", "diameter": q(1.1, "m")},
     "readings": {"kind": "velocity_pressure", "unit": "Pa", "lines": PA20}, "probe": {"coefficient": 0.84}, "air": {"density": q(0.82, "kg/m3")}},
    {"title": "fast air, compressibility applied, si", "units": "si", "duct": {"shape": "round", "measured": "inside", "diameter": q(250, "mm")},
     "readings": {"kind": "velocity_pressure", "unit": "Pa", "lines": [[900, 1450, 1600, 1580, 1420, 880], [870, 1440, 1610, 1590, 1390, 860]]}, "air": {"dryBulb": q(20, "degC"), "barometricPressure": q(101.325, "kPa")}},
    {"title": "readings left out and below zero, freezing air, ip", "units": "ip", "duct": {"shape": "rectangular", "measured": "outside", "width": q(4, "ft"), "height": q(30, "in"), "wall": {"thickness": q(0.0625, "in"), "lining": q(2, "in")}},
     "readings": {"kind": "velocity_pressure", "unit": "in_wg", "lines": [[0.02, None, 0.031, 0.028], [-0.004, 0.019, 0.03, 0.027], [0.012, 0.022, None, 0.03]]}, "air": {"dryBulb": q(18, "degF"), "relativeHumidity": q(70, "percent"), "barometricPressure": q(29.12, "inHg")}},
    {"title": "square duct in mixed units, si", "units": "si", "duct": {"shape": "rectangular", "measured": "outside", "width": q(61, "cm"), "height": q(2, "ft"), "wall": {"thickness": q(13, "mm")}},
     "readings": {"kind": "velocity", "unit": "ft/min", "lines": V12}, "air": {"dryBulb": q(303.15, "K"), "relativeHumidity": q(100, "percent"), "barometricPressure": q(990, "hPa")}},
    {"title": "round, velocity pressure in psi, 10,000 ft, ip", "units": "ip", "duct": {"shape": "round", "measured": "inside", "diameter": q(20, "in")},
     "readings": {"kind": "velocity_pressure", "unit": "psi", "lines": [[0.0021, 0.0029, 0.0034, 0.0033, 0.0027, 0.002], [0.0022, 0.003, 0.0035, 0.0033, 0.0028, 0.0021]]}, "air": {"dryBulb": q(45, "degF"), "altitude": q(10000, "ft")}},
    {"title": "custom layout with weights, wet bulb below freezing, normal air, si", "units": "si", "standardAir": "normal", "duct": {"shape": "rectangular", "measured": "inside", "width": q(800, "mm"), "height": q(500, "mm")},
     "readings": {"kind": "velocity_pressure", "unit": "Pa", "lines": [[22.5, 31, 24.1], [26.2, 35.4, 27.7]], "weights": [[1, 2.5, 1], [2, 5, 2]]}, "air": {"dryBulb": q(-2, "degC"), "wetBulb": q(-3.5, "degC"), "barometricPressure": q(940, "mbar")}},
    {"title": "calibrated thermal instrument, dry stack standard air, ip", "units": "ip", "standardAir": "epa", "duct": {"shape": "round", "measured": "inside", "diameter": q(18, "in")},
     "readings": {"kind": "velocity", "unit": "ft/min", "lines": V12}, "instrument": {"principle": "thermal", "assumedDensity": q(0.075, "lb/ft3"), "calibration": {"gain": 1.015, "offset": -6}}, "air": {"dryBulb": q(140, "degF"), "dewPoint": q(88, "degF"), "barometricPressure": q(28.4, "inHg"), "ductStaticPressure": q(-4.5, "in_wg")}},
    {"title": "differential pressure instrument in SI that assumed standard air, below sea level, si", "units": "si", "duct": {"shape": "flat_oval", "measured": "outside", "major": q(0.9, "m"), "minor": q(350, "mm"), "wall": {"thickness": q(1.2, "mm"), "lining": q(25, "mm")}},
     "readings": {"kind": "velocity", "unit": "m/s", "lines": MS9}, "instrument": {"principle": "differential_pressure"}, "air": {"dryBulb": q(33, "degC"), "relativeHumidity": q(62, "percent"), "altitude": q(-120, "m")}},
]

for case in CASES:
    case["standard"] = STANDARD[case.get("standardAir", "ashrae" if case["units"] == "ip" else "iso")]
    case["expected"] = solve(case)
    del case["standard"]
print(json.dumps({"command": "python3 tests/reference/traverses.py > tests/reference/traverses.json", "cases": CASES}, indent=1))
