#!/usr/bin/env bash
# Shares a run out over a Slurm cluster and merges the parts:
#
#     submit.sh LIST OUT PARTS [options of zladder run ...]
#
# LIST   file with one path a line, the same for all tasks: make it once and leave it alone
# OUT    folder on a disk that all nodes see; gets a folder for each part, and the catalogue
# PARTS  number of tasks; some minutes of work each keep the start of the program cheap
#
# Options for sbatch go into the environment (SBATCH_PARTITION, SBATCH_TIMELIMIT, ...) or into the heads of the two scripts.
set -euo pipefail

if [ $# -lt 3 ]; then
    sed -n '2,8s/^# \{0,1\}//p' "$0"
    exit 2
fi

here=$(cd "$(dirname "$0")" && pwd)
list=$(realpath "$1") out=$(realpath -m "$2") parts=$3
shift 3
mkdir -p "$out"
job=$(sbatch --parsable --array="1-$parts" --output="$out/part-%a.log" "$here/part.sh" "$parts" "$list" "$out" "$@")
merge=$(sbatch --parsable --dependency="afterany:$job" --output="$out/merge.log" "$here/merge.sh" "$parts" "$out")
echo "parts: job $job, merge: job $merge; the catalogue will be in $out/catalogue"
