#!/usr/bin/env bash
# clean_system.sh BUILD [MIRROR]: installs the package of BUILD with apt on a
# Debian 12 that has nothing else (debootstrap, in a folder of its own), and
# runs it there as a user would. Needs root, a network and debootstrap; takes
# about two minutes. Not one of ctest's: run it before handing over a package.
set -euo pipefail
build=$(readlink -f "$1") mirror=${2-http://deb.debian.org/debian}

folder=$(mktemp -d)
clean_up() {
  umount -q "$folder/root/proc" || true
  rm -rf --one-file-system "$folder"
}
trap clean_up EXIT
cpack -G DEB --config "$build/CPackConfig.cmake" -B "$folder" >/dev/null
debootstrap --variant=minbase bookworm "$folder/root" "$mirror" >"$folder/log" ||
  { tail -20 "$folder/log"; exit 1; }
cp "$folder"/gatedyno_*.deb "$folder/root/tmp/"
# Whatever this machine needs to reach the mirror.
cp -r /etc/apt/apt.conf.d/. "$folder/root/etc/apt/apt.conf.d/"
cp /etc/resolv.conf "$folder/root/etc/resolv.conf"
mount -t proc proc "$folder/root/proc"
inside() { chroot "$folder/root" /usr/bin/env -i PATH=/usr/bin:/bin:/usr/sbin:/sbin HOME=/root "$@"; }
inside apt-get -q update >/dev/null
inside sh -c 'DEBIAN_FRONTEND=noninteractive apt-get -q install -y --no-install-recommends /tmp/gatedyno_*.deb' \
  >"$folder/install.log" || { tail -20 "$folder/install.log"; exit 1; }
grep -E '^(The following NEW|Need to get)' "$folder/install.log" || true
inside gatedyno --version
inside sh -c 'cd /root && gatedyno run "nand*" --store x.db | tail -3; gatedyno report x.db -o x.html && ls -l x.html'
inside apt-get -q remove -y gatedyno >/dev/null
if inside sh -c 'command -v gatedyno'; then
  echo "still there after its removal" >&2
  exit 1
fi
