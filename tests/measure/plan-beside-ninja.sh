#!/usr/bin/env bash
# How long `bladeloads plan` takes with nothing to do, beside ninja with as many targets that are up to date, in the same run:
#   tests/measure/plan-beside-ninja.sh [CASES...]        default: 1000 10000
# Needs ninja (Debian: ninja-build) and a Release build. Makes both trees, solves the cases once (about 10 ms each), then runs the two
# in turn and prints medians and their ratio. A target of ninja has what a case has: an input of its own, the two tables that all share,
# and one or all of the files of its result as outputs.
set -euo pipefail
cd "$(dirname "${BASH_SOURCE[0]}")/../.."
tool=${BLADELOADS:-"dotnet $PWD/src/BladeLoads/bin/Release/net10.0/bladeloads.dll"}
rounds=${ROUNDS:-15}
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT

ninja_tree() { # folder, number, outputs of a target
    local folder=$1 number=$2 outputs=$3
    mkdir -p "$folder/in" "$folder/out"
    echo blade >"$folder/blade.csv"
    echo polar >"$folder/polar.csv"
    {
        # One line of shell a target would take minutes: the files are made beforehand, and the first run only records them.
        echo 'rule solve'
        echo '  command = true'
        echo '  restat = 0'
        for ((i = 1; i <= number; i++)); do
            local out=""
            for o in $outputs; do out+=" out/$i/$o"; done
            echo "build$out: solve in/$i.toml | blade.csv polar.csv"
        done
    } >"$folder/build.ninja"
    for ((i = 1; i <= number; i++)); do echo "$i" >"$folder/in/$i.toml"; done
    (cd "$folder" && seq 1 "$number" | sed 's|^|out/|' | xargs mkdir -p && for o in $outputs; do seq 1 "$number" | sed "s|.*|out/&/$o|" | xargs touch; done)
    (cd "$folder" && ninja -j2 >/dev/null && ninja | grep -q 'no work to do')
}

milliseconds() { # command...
    local before after
    before=$(date +%s%N)
    "$@" >/dev/null
    after=$(date +%s%N)
    echo "$(((after - before) / 1000))" | awk '{ printf "%.1f\n", $1 / 1000 }'
}

median() { sort -n | awk '{ a[NR] = $1 } END { print (NR % 2 ? a[(NR + 1) / 2] : (a[NR / 2] + a[NR / 2 + 1]) / 2) }'; }

printf '%8s  %10s  %14s  %14s  %6s  %6s\n' cases 'plan ms' 'ninja 1 ms' 'ninja 3 ms' 'ratio1' 'ratio3'
for number in "${@:-1000 10000}"; do
    for n in $number; do
        tests/measure/many-cases.sh "$work/$n/study" "$n"
        (cd "$work/$n" && $tool run study --quiet >/dev/null)
        ninja_tree "$work/$n/one" "$n" "receipt.json"
        ninja_tree "$work/$n/three" "$n" "receipt.json power-curve.csv case.log"
        sleep 3   # nothing is trusted that changed less than two seconds before
        (cd "$work/$n" && $tool plan study | tail -1 | grep -q 'nothing to run' && sleep 0)
        : >"$work/plan"; : >"$work/one"; : >"$work/three"
        for ((r = 0; r < rounds; r++)); do
            (cd "$work/$n" && milliseconds $tool plan study) >>"$work/plan"
            milliseconds ninja -C "$work/$n/one" >>"$work/one"
            milliseconds ninja -C "$work/$n/three" >>"$work/three"
        done
        plan=$(median <"$work/plan") one=$(median <"$work/one") three=$(median <"$work/three")
        awk -v n="$n" -v p="$plan" -v o="$one" -v t="$three" 'BEGIN { printf "%8d  %10.1f  %14.1f  %14.1f  %6.2f  %6.2f\n", n, p, o, t, p / o, p / t }'
    done
done
