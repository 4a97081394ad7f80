#!/usr/bin/env bash
# Writes a study of many small cases, a file each: many-cases.sh FOLDER NUMBER
set -euo pipefail
study=$1 number=$2
mkdir -p "$study/cases" "$study/blades" "$study/polars/clean"
cat >"$study/study.toml" <<'TOML'
blade  = "blades/beck.csv"
polars = "polars/clean"
[rotor]
blade_count = 3
[wind]
speeds_m_s = [8]
[control]
strategy        = "fixed-speed"
rotor_speed_rpm = 34
pitch_deg       = 0.0
[model]
elements = 10
[outputs]
spanwise = "none"
TOML
printf '%s\n' radius_m,chord_m,twist_deg,section 1,1.4,14,beck 20,0.4,0,beck >"$study/blades/beck.csv"
printf '%s\n' alpha_deg,cl,cd -180,0,0.02 -20,-0.8,0.2 0,0.3,0.01 12,1.3,0.02 30,0.9,0.4 180,0,0.02 >"$study/polars/clean/beck.csv"
for ((i = 1; i <= number; i++)); do
    printf 'title = "Air %d"\n[air]\ndensity_kg_m3 = 1.%05d\n' "$i" "$i" >"$study/cases/air-$(printf %05d "$i").toml"
done
