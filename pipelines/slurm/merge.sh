#!/usr/bin/env bash
#SBATCH --job-name=zladder-merge
# Merges the parts of a run; parts that are missing or not finished are named, to be given again with part.sh:
#
#     sbatch merge.sh PARTS OUT
set -euo pipefail

parts=$1 out=$2
folders=()
for ((part = 1; part <= parts; part++)); do
    # A part that never began is left to the merge to name.
    if [ -e "$out/part-$part" ]; then folders+=("$out/part-$part"); fi
done
exec "${ZLADDER:-zladder}" merge "${folders[@]}" --out "$out/catalogue"
