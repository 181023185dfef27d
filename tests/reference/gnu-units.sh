#!/bin/sh
# Factors to SI of every unit of the engine, and some temperatures, from GNU units (Debian package units):
#
#     sh tests/reference/gnu-units.sh > tests/reference/gnu-units.json
#
# Each line below: the quantity, the engine's name of the unit, its name in GNU units, the SI unit.
set -eu
ask() { units -t -d 15 "$1" "$2"; }

{
  while IFS='|' read -r kind unit from to; do
    printf '%s|%s|%s|%s|%s\n' "$kind" "$unit" "$from" "$to" "$(ask "$from" "$to")"
  done <<'UNITS'
length|in|inch|m
length|ft|foot|m
length|mm|mm|m
length|cm|cm|m
length|m|m|m
area|in2|inch^2|m^2
area|ft2|foot^2|m^2
area|m2|m^2|m^2
velocity|ft/min|foot/minute|m/s
velocity|m/s|m/s|m/s
pressure|in_wg|inH2O|Pa
pressure|Pa|Pa|Pa
pressure|hPa|hPa|Pa
pressure|kPa|kPa|Pa
pressure|inHg|inHg|Pa
pressure|mbar|mbar|Pa
pressure|psi|psi|Pa
temperature|degF|degF|K
temperature|degC|degC|K
temperature|K|K|K
density|lb/ft3|lb/foot^3|kg/m^3
density|kg/m3|kg/m^3|kg/m^3
specificVolume|ft3/lb|foot^3/lb|m^3/kg
specificVolume|m3/kg|m^3/kg|m^3/kg
airflow|ft3/min|foot^3/minute|m^3/s
airflow|L/s|L/s|m^3/s
airflow|m3/s|m^3/s|m^3/s
airflow|m3/h|m^3/hour|m^3/s
massFlow|lb/min|lb/minute|kg/s
massFlow|kg/s|kg/s|kg/s
speed|rpm|1/minute|1/s
power|hp|hp|W
power|kW|kW|W
ratio|percent|percent|1
UNITS
  for f in -40 0 68 70 212; do printf 'temperatures|degF|%s|%s\n' "$f" "$(ask "tempF($f)" K)"; done
  for c in -40 0 21.5 200; do printf 'temperatures|degC|%s|%s\n' "$c" "$(ask "tempC($c)" K)"; done
} | python3 -c '
import json, subprocess, sys
factors, temperatures = [], []
for line in sys.stdin:
    kind, unit, *rest = line.rstrip("\n").split("|")
    if kind == "temperatures":
        temperatures.append({"value": float(rest[0]), "unit": unit, "kelvin": float(rest[1])})
    else:
        factors.append({"kind": kind, "unit": unit, "from": rest[0], "to": rest[1], "factor": float(rest[2])})
version = subprocess.run(["units", "--version"], capture_output=True, text=True).stdout.splitlines()[0]
print(json.dumps({"library": version, "command": "sh tests/reference/gnu-units.sh > tests/reference/gnu-units.json", "factors": factors, "temperatures": temperatures}, indent=1))
'
