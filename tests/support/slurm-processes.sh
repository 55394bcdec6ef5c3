# Which processes of a private Slurm are ours.  Read by the scripts beside it,
# with `folder` set.  FOLDER/run/NAME holds "PID START-TIME" of a daemon, so that
# a number used again is never taken for it.
# shellcheck shell=bash

# start_time PID: nothing for one that is gone or waits to be reaped.
start_time() {
  sed 's/.*) //' "/proc/$1/stat" 2>/dev/null | awk '$1 != "Z" { print $20 }'
}

# is PID START-TIME
is() { [ -n "$2" ] && [ "$(start_time "$1")" = "$2" ]; }

# alive NAME
alive() {
  local pid started
  [ -s "${folder:?}/run/$1" ] && read -r pid started <"$folder/run/$1" &&
    is "$pid" "$started"
}

# end PID START-TIME SECONDS: TERM, wait, KILL.
end() {
  local i
  is "$1" "$2" || return 0
  kill -TERM "$1" 2>/dev/null || true
  for ((i = 0; i < $3 * 10; i++)); do
    is "$1" "$2" || return 0
    sleep 0.1
  done
  kill -KILL "$1" 2>/dev/null || true
  for ((i = 0; i < 50; i++)); do
    is "$1" "$2" || return 0
    sleep 0.1
  done
  echo "process $1 outlived KILL" >&2
  return 1
}

# step_daemons: those of this cluster work in its log folder.
step_daemons() {
  local process
  for process in $(pgrep -x slurmstepd); do
    [ "$(readlink "/proc/$process/cwd" 2>/dev/null)" = "$folder/log" ] &&
      echo "$process"
  done
  return 0
}

# descendants PID: children last to first.
descendants() {
  local child
  for child in $(ps -o pid= --ppid "$1"); do
    descendants "$child"
    echo "$child"
  done
}

# on_node PID NAME: whether any process below the step daemon runs on that node.
on_node() {
  local process
  for process in $(descendants "$1"); do
    tr '\0' '\n' <"/proc/$process/environ" 2>/dev/null |
      grep -qx "SLURMD_NODENAME=$2" && return 0
  done
  return 1
}

# kill_steps [NAME]: as the power of that node, or of all, going off.
kill_steps() {
  local daemon
  for daemon in $(step_daemons); do
    [ -z "${1-}" ] || on_node "$daemon" "$1" || continue
    # shellcheck disable=SC2046
    kill -KILL "$daemon" $(descendants "$daemon") 2>/dev/null || true
  done
}
