#!/usr/bin/env bash
# check_format.sh accepts a formatted source and refuses one that is not.
set -u
here=$(dirname "$(readlink -f "$0")")
root=$here/../..
tree=$(mktemp -d)
trap 'rm -rf "$tree"' EXIT
mkdir -p "$tree/harness" "$tree/tests"
cp "$root/.clang-format" "$tree"
printf 'int Twice(int x);\n' >"$tree/harness/good.h"
bash "$here/check_format.sh" "$tree"
status=$?
((status == 77)) && exit 77
((status == 0)) || { echo "refuses a formatted source"; exit 1; }
printf 'int  Twice( int x );\n' >"$tree/tests/bad.cc"
if bash "$here/check_format.sh" "$tree" 2>/dev/null; then
  echo "accepts a source that is not formatted"
  exit 1
fi
