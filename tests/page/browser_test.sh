#!/usr/bin/env bash
# browser_test.sh FOLDER REPORTS: the tests of *_test.mjs, on the pages of
# REPORTS. Exits with 77 where a browser or its driver cannot be had. The
# driver's packages go to FOLDER, from npm, the versions of package-lock.json.
set -euo pipefail
folder=$1 reports=$2
here=$(dirname "$(readlink -f "$0")")

skip() { echo "skipped: $*"; exit 77; }

for program in node npm chromium; do
  command -v "$program" >/dev/null ||
    skip "$program is not installed (Debian's packages: nodejs npm chromium)"
done
mkdir -p "$folder"
cp "$here"/{package.json,package-lock.json,.npmrc} "$folder"
if ! cmp -s "$here/package-lock.json" "$folder/installed-lock.json"; then
  (cd "$folder" && npm ci --no-progress >npm.log 2>&1) ||
    skip "npm cannot fetch playwright-core and axe-core: see $folder/npm.log"
  cp "$here/package-lock.json" "$folder/installed-lock.json"
fi
rm -f "$folder"/*.mjs
cp "$here"/*.mjs "$folder"
cd "$folder"
REPORTS=$reports CHROMIUM=$(command -v chromium) exec node --test ./*_test.mjs
