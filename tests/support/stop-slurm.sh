#!/usr/bin/env bash
# stop-slurm.sh FOLDER [NODE]
#
# Without NODE: cancels all jobs of the cluster that start-slurm.sh started under
# FOLDER and ends its daemons, by their process numbers, and no other process.
# With NODE ("node2"): that node dies, its daemon and its tasks at once, as if its
# power went off.  The last line printed is STOPPED.
set -euo pipefail
folder=$(realpath -m -- "${1:?usage: stop-slurm.sh FOLDER [NODE]}")
node=${2-}
# shellcheck source=tests/support/slurm-processes.sh
. "$(dirname "$0")/slurm-processes.sh"
export SLURM_CONF="$folder/etc/slurm.conf"

# end_recorded NAME SECONDS
end_recorded() {
  local pid started
  [ -s "$folder/run/$1" ] || return 0
  read -r pid started <"$folder/run/$1"
  end "$pid" "$started" "$2" && rm -f "$folder/run/$1" "$folder/run/$1.pidfile"
}

if [ -n "$node" ]; then
  read -r pid started <"$folder/run/$node"
  is "$pid" "$started" && kill -KILL "$pid"
  kill_steps "$node"
  rm -f "$folder/run/$node" "$folder/run/$node.pidfile"
  echo STOPPED
  exit 0
fi

if [ -s "$folder/run/slurmctld" ] && alive slurmctld; then
  timeout 20 scancel -u root 2>/dev/null || true
  for ((i = 0; i < 50; i++)); do
    [ -z "$(timeout 5 squeue -h -o %A 2>/dev/null)" ] && break
    sleep 0.2
  done
fi
for file in "$folder"/run/node*; do
  case $file in
    *.pidfile | *'*') ;;
    *) end_recorded "$(basename "$file")" 10 ;;
  esac
done
end_recorded slurmctld 20
end_recorded munged 5
kill_steps
echo STOPPED
