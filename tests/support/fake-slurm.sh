#!/usr/bin/env bash
# A Slurm of one script, for tests without a cluster: called as scontrol, sbatch,
# squeue or scancel.  Its state is the folder $FAKE_SLURM:
#   max-array          MaxArraySize
#   last               number of the last array
#   queue/NAME.I.N     task I of array N, which is called NAME: its process
#   lies/LIE           how often it will tell that lie
# Tasks run at once, all of them.
set -u
state=$FAKE_SLURM
mkdir -p "$state/queue" "$state/lies"

# lie NAME: whether to tell it, once less from now on.
lie() {
  local left
  left=$(cat "$state/lies/$1" 2>/dev/null) || return 1
  [ "$left" -gt 0 ] || return 1
  echo $((left - 1)) >"$state/lies/$1"
}

# alive ENTRY
alive() {
  sed 's/.*) //' "/proc/$(cat "$1")/stat" 2>/dev/null | grep -qv '^Z'
}

# end ENTRY
end() {
  [ "$(cat "$1")" = held ] && { rm -f "$1"; return; }
  alive "$1" && kill -TERM "$(cat "$1")" 2>/dev/null
}

submit() {
  local argument name='' indices='' log='' command='' number range i entry
  for argument in "$@"; do
    case $argument in
      --job-name=*) name=${argument#*=} ;;
      --array=*) indices=${argument#*=} ;;
      --output=*) log=${argument#*=} ;;
      --wrap=*) command=${argument#*=} ;;
    esac
  done
  number=$(($(cat "$state/last" 2>/dev/null || echo 0) + 1))
  echo "$number" >"$state/last"
  printf '%s\n' "$@" >"$state/arguments-$number"
  for range in ${indices//,/ }; do
    for ((i = ${range%-*}; i <= ${range#*-}; i++)); do
      entry=$state/queue/$name.$i.$number
      if lie held; then
        echo held >"$entry"
        continue
      fi
      SLURM_ARRAY_TASK_ID=$i bash -c "$command" </dev/null \
        >>"$(sed "s/%a/$i/; s/%A/$number/" <<<"$log")" 2>&1 &
      echo $! >"$entry"
    done
  done
  if lie other-words; then echo "all is well"; else echo "$number;farm"; fi
}

show() {
  local names entry name index number
  names=$(sed -n 's/^--name=//p' < <(printf '%s\n' "$@"))
  for entry in "$state"/queue/*; do
    IFS=. read -r name index number <<<"$(basename "$entry")"
    [[ ,$names, == *",$name,"* ]] || continue
    if [ "$(cat "$entry")" = held ]; then
      echo "$name|$index|$number|launch failed requeued held"
    elif alive "$entry" || [ -e "$state/lies/never-ends" ]; then
      echo "$name|$index|$number|None"
    fi
  done
}

case $(basename "$0") in
  scontrol)
    echo "MaxArraySize            = $(cat "$state/max-array" 2>/dev/null ||
      echo 1001)"
    ;;
  sbatch)
    lie sbatch-hangs && exec sleep 30
    if lie sbatch-refuses; then
      echo "sbatch: error: invalid partition specified: fast" >&2
      exit 1
    fi
    submit "$@"
    ;;
  squeue)
    if lie squeue-fails; then
      echo "slurm_load_jobs error: Unable to contact slurm controller" >&2
      exit 1
    fi
    lie forgets || show "$@"
    ;;
  scancel)
    case $1 in
      --name=*) pattern="${1#*=}.*.*" ;;
      *) pattern="*.${1#*_}.${1%_*}" ;;
    esac
    # shellcheck disable=SC2231
    for entry in "$state"/queue/$pattern; do
      [ -e "$entry" ] && end "$entry"
    done
    exit 0
    ;;
esac
