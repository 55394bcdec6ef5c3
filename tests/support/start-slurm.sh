#!/usr/bin/env bash
# start-slurm.sh FOLDER [NODES [CPUS_PER_NODE]]
#
# Starts a private Slurm under FOLDER for the farm's tests, as root: munged,
# slurmctld and one slurmd a node, all on this machine's own address, without
# systemd, a database, cgroups or anything in /etc.  Started again, it keeps what
# runs and starts what died.  The last line printed is READY; FOLDER/env.sh then
# sets SLURM_CONF.  Installs nothing: exits 77, in words, where Slurm cannot run.
#
# SLURM_DEAD_AFTER: seconds of silence before a node is called dead (5).
# SLURM_REQUEUE_IN: seconds before a requeued task may start again (5, the least).
set -euo pipefail
folder=$(realpath -m -- "${1:?usage: start-slurm.sh FOLDER [NODES [CPUS]]}")
nodes=${2:-1}
cpus=${3:-2}
# shellcheck source=tests/support/slurm-processes.sh
. "$(dirname "$0")/slurm-processes.sh"

die() { echo "start-slurm: $*" >&2; exit 1; }
skip() { echo "start-slurm: skipped: $*"; exit 77; }

[ "$(id -u)" = 0 ] || skip "a private Slurm must be started by root"
for command in munged slurmctld slurmd sbatch ss; do
  command -v "$command" >/dev/null ||
    skip "$command is not installed (slurm-wlm munge libpmix2 iproute2)"
done
# A step's socket, FOLDER/spool/nodeN/nodeN_JOB.STEP, must stay below 108 bytes.
[ ${#folder} -le 60 ] || die "folder path longer than 60 characters: $folder"
[[ $folder =~ ^[A-Za-z0-9_./+-]+$ ]] ||
  die "folder path may hold only A-Za-z0-9_./+-: $folder"

# Slurm looks up its own host name, and gets no answer at all, not even 127.*,
# on a host whose only IPv4 addresses are 127.* (AI_ADDRCONFIG).
host=$(hostname -s)
address=$(getent ahostsv4 "$host" | awk 'NR == 1 { print $1 }')
[ -n "$address" ] || skip "the host name $host has no address in /etc/hosts"
ip -4 -o addr | awk '$4 !~ /^127\./ { found = 1 } END { exit !found }' ||
  skip "no IPv4 address outside 127.*: ip addr add 192.0.2.1/32 dev lo"

umask 022
mkdir -p "$folder"/{etc,munge,state,log,run}
# munge refuses a socket that not everybody can reach.
chmod a+x "$folder" "$folder/munge"
chmod 700 "$folder/state"
names=()
for ((i = 1; i <= nodes; i++)); do
  names+=("node$i")
  mkdir -p "$folder/spool/node$i"
done

# The first NODES + 1 ports in a row that nobody listens at.
free_port() {
  local used port i free
  used=" $(ss -Hltn | awk '{ n = split($4, a, ":"); print a[n] }' |
    tr '\n' ' ')"
  for ((port = 16817; port < 30000; port += 100)); do
    free=yes
    for ((i = 0; i <= nodes; i++)); do
      [[ $used == *" $((port + i)) "* ]] && free=no
    done
    [ $free = yes ] && { echo $port; return 0; }
  done
  die "no free ports"
}

write_configuration() {
  local port memory i
  port=$(free_port)
  memory=$(awk -v n="$nodes" \
    '/^MemTotal/ { print int($2 / 1024 * 0.9 / n) }' /proc/meminfo)
  cat >"$folder/etc/slurm.conf" <<CONF
ClusterName=farm
SlurmctldHost=$host($address)
SlurmctldPort=$port
SlurmUser=root
SlurmdUser=root
AuthType=auth/munge
CredType=cred/munge
AuthInfo=socket=$folder/munge/socket,cred_expire=${SLURM_REQUEUE_IN:-5}
CommunicationParameters=NoInAddrAny,NoCtldInAddrAny
StateSaveLocation=$folder/state
SlurmdSpoolDir=$folder/spool/%n
SlurmctldPidFile=$folder/run/slurmctld.pidfile
SlurmdPidFile=$folder/run/%n.pidfile
SlurmctldLogFile=$folder/log/slurmctld.log
SlurmdLogFile=$folder/log/%n.log
MailProg=/bin/true
ProctrackType=proctrack/linuxproc
TaskPlugin=task/none
MpiDefault=none
PropagateResourceLimits=NONE
SelectType=select/cons_tres
SelectTypeParameters=CR_CPU
JobAcctGatherType=jobacct_gather/none
AccountingStorageType=accounting_storage/none
JobCompType=jobcomp/filetxt
JobCompLoc=$folder/log/jobcomp.log
SchedulerType=sched/backfill
SchedulerParameters=batch_sched_delay=0,sched_min_interval=0,bf_interval=1
MaxArraySize=1001
KillWait=5
MessageTimeout=2
JobRequeue=1
ReturnToService=2
SlurmdTimeout=${SLURM_DEAD_AFTER:-5}
SlurmdParameters=config_overrides
PartitionName=main Nodes=ALL Default=YES DefaultTime=60 MaxTime=INFINITE State=UP
CONF
  for ((i = 1; i <= nodes; i++)); do
    echo "NodeName=node$i NodeHostname=$host NodeAddr=$address" \
      "Port=$((port + i)) CPUs=$cpus RealMemory=$memory State=UNKNOWN" \
      >>"$folder/etc/slurm.conf"
  done
  printf 'CgroupPlugin=cgroup/v1\n' >"$folder/etc/cgroup.conf"
}

# record NAME PIDFILE: notes the daemon once it runs.
record() {
  local i pid
  for ((i = 0; i < 100; i++)); do
    pid=$(cat "$2" 2>/dev/null || true)
    if [ -n "$pid" ] && [ -n "$(start_time "$pid")" ]; then
      echo "$pid $(start_time "$pid")" >"$folder/run/$1"
      return 0
    fi
    sleep 0.1
  done
  tail -n 5 "$folder"/log/*.log >&2 || true
  die "$1 did not start"
}

[ -s "$folder/munge/key" ] || (umask 077; dd if=/dev/urandom \
  of="$folder/munge/key" bs=1024 count=1 status=none)
[ -s "$folder/etc/slurm.conf" ] || write_configuration
touch "$folder/log/jobcomp.log"
export SLURM_CONF="$folder/etc/slurm.conf"
echo "export SLURM_CONF=$SLURM_CONF" >"$folder/env.sh"

# Daemons keep the folder they were started in.
cd "$folder"
if ! alive munged; then
  rm -f munge/socket munge/socket.lock munge/pidfile
  munged --socket="$folder/munge/socket" --key-file="$folder/munge/key" \
    --pid-file="$folder/munge/pidfile" --log-file="$folder/log/munged.log" \
    --seed-file="$folder/munge/seed" </dev/null >>log/start.log 2>&1 ||
    die "munged: see $folder/log"
  record munged munge/pidfile
fi
if ! alive slurmctld; then
  rm -f run/slurmctld.pidfile
  slurmctld </dev/null >>log/start.log 2>&1 || die "slurmctld: see $folder/log"
  record slurmctld run/slurmctld.pidfile
fi
for name in "${names[@]}"; do
  alive "$name" && continue
  rm -f "run/$name.pidfile"
  slurmd -N "$name" </dev/null >>log/start.log 2>&1 ||
    die "slurmd: see $folder/log"
  record "$name" "run/$name.pidfile"
done

for ((i = 1; i <= 300; i++)); do
  states=$(sinfo -h -N -o '%N %T' 2>/dev/null || true)
  up=$(grep -cE ' (idle|mixed|allocated|completing)$' <<<"$states" || true)
  [ "$up" = "$nodes" ] && { echo READY; exit 0; }
  # Nodes set down by an earlier mishap are put back to work.
  ((i % 20)) || while read -r name state; do
    case $state in
      drain* | down) scontrol update "nodename=$name" state=resume || true ;;
    esac
  done <<<"$states"
  sleep 0.1
done
sinfo -N -o '%N %T %E' >&2 || true
die "nodes not up after 30 s; see $folder/log"
