#!/usr/bin/env bash
#SBATCH --job-name=zladder-part
#SBATCH --cpus-per-task=1
#SBATCH --requeue
#SBATCH --open-mode=append
# One part of a run, as a task of a job array:
#
#     sbatch --array=3,7 part.sh PARTS LIST OUT [options of zladder run ...]
#
# A task that is requeued, or given again after a failure, goes on where it was: its folder holds what was done. The number of parts is
# an argument, because Slurm counts only the tasks of the array at hand.
set -euo pipefail

parts=$1 list=$2 out=$3
shift 3
# In place of the shell, so that the program itself hears of the end of its time and can commit what it has.
exec "${ZLADDER:-zladder}" run --from "$list" --shard "$SLURM_ARRAY_TASK_ID/$parts" --out "$out/part-$SLURM_ARRAY_TASK_ID" "$@"
