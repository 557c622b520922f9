#!/usr/bin/env bash
# Makes an order of virtual lots in parts, as many at a time as there are processors, and puts them together. GNU parallel hands out the parts;
# with `--sshloginfile machines` it does so over several machines. A part that is there already is not made again, so that a broken run goes on.
#
#   parallel.sh REQUIREMENT UNITS PARTS FOLDER
set -euo pipefail
requirement=$1 units=$2 parts=$3 folder=$4
mkdir -p "$folder"

make_part() {
    [ -s "$3/part-$1.json" ] || bandspec try "$REQUIREMENT" --units "$UNITS" --part "$1/$2" --threads 1 --quiet --out "$3/part-$1.json"
}
export -f make_part
export REQUIREMENT=$requirement UNITS=$units

seq "$parts" | parallel --halt soon,fail=1 make_part {} "$parts" "$folder"
bandspec gather "$folder"/part-*.json
