#!/usr/bin/env bash
# The shell scripts are as the tool shellcheck likes them.
# Usage: check_shell.sh ROOT.  Exits 77, in words, where the tool is missing.
set -euo pipefail
cd "$1"
if ! command -v shellcheck >/dev/null; then
  echo "skipped: shellcheck is not installed"
  exit 77
fi
mapfile -t scripts < <(find tests -name '*.sh')
scripts+=(reports/make_sample tests/bench/run)
shellcheck quickstart .ci/run "${scripts[@]}"
echo "all scripts are clean"
