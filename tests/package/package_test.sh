#!/usr/bin/env bash
# package_test.sh BUILD CPACK: makes the Debian package, checks what is in it
# and what it depends on, and runs the program from the unpacked files.
# clean_system.sh installs it on a Debian that has nothing else.
set -euo pipefail
build=$(readlink -f "$1") cpack=$2

skip() { echo "skipped: $*"; exit 77; }
fail() { echo "failed: $*"; exit 1; }

for program in dpkg-deb dpkg-shlibdeps gzip; do
  command -v "$program" >/dev/null ||
    skip "$program is not installed (Debian's package dpkg-dev)"
done
folder=$(mktemp -d)
trap 'rm -rf "$folder"' EXIT
"$cpack" -G DEB --config "$build/CPackConfig.cmake" -B "$folder" >"$folder/log" 2>&1 ||
  { cat "$folder/log"; fail "cpack"; }
package=$(echo "$folder"/gatedyno_*.deb)

depends=$(dpkg-deb -f "$package" Depends)
echo "depends: $depends"
for library in libngspice0 libsqlite3-0 libfmt9 libc6; do
  [[ $depends == *"$library"* ]] || fail "does not depend on $library"
done
[[ $depends != *-dev* ]] || fail "depends on what only a build needs"

dpkg-deb -x "$package" "$folder/root"
cd "$folder/root/usr"
for file in bin/gatedyno bin/gatedyno-worker share/man/man1/gatedyno.1.gz \
  share/bash-completion/completions/gatedyno share/zsh/vendor-completions/_gatedyno \
  share/fish/vendor_completions.d/gatedyno.fish share/doc/gatedyno/copyright \
  share/gatedyno/models/p45.json share/gatedyno/decks/plans/arbiter.json \
  share/gatedyno/decks/plan.schema.json share/gatedyno/reports/result.schema.json; do
  [ -f "$file" ] || fail "$file is missing"
done
gzip -dc share/man/man1/gatedyno.1.gz | grep -q '^.SS release$' ||
  fail "the manual page lacks a command"
leaked=$(grep -rl "$build" . || true)
[ -z "$leaked" ] || fail "the build's folder is named in: $leaked"
bin/gatedyno --version
bin/gatedyno run inv --store "$folder/run.db" --node p65 | tail -1
bin/gatedyno report "$folder/run.db" -o "$folder/run.html"
