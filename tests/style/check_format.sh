#!/usr/bin/env bash
# Every C++ source is as clang-format-14 leaves it.
# Usage: check_format.sh ROOT.  Exits 77, in words, where the tool is missing.
set -euo pipefail
cd "$1"
if ! command -v clang-format-14 >/dev/null; then
  echo "skipped: clang-format-14 is not installed"
  exit 77
fi
find harness tests \( -name '*.h' -o -name '*.cc' \) -print0 |
  xargs -0 clang-format-14 --dry-run -Werror
echo "all sources are formatted"
