#!/usr/bin/env bash
# make_reports.sh FOLDER GATEDYNO PAGE_STORES: every format of every run of
# runs.h, as a user would make them.
set -euo pipefail
folder=$1 gatedyno=$2 page_stores=$3
"$page_stores" "$folder"
for run in sample hostile large exempt empty; do
  start=$(date +%s%N)
  "$gatedyno" report "$folder/$run.db" -o "$folder/$run.html"
  echo "$run.html: $((($(date +%s%N) - start) / 1000000)) ms," \
    "$(stat -c %s "$folder/$run.html") bytes"
  "$gatedyno" report "$folder/$run.db" --json "$folder/$run.json" \
    --csv "$folder/$run.csv" --junit "$folder/$run.xml" \
    --markdown "$folder/$run.md" >"$folder/$run.txt"
done

# Each run against its second store, and the sample against itself.
mkdir -p "$folder/versus"
compare() {
  local name=$1 a=$2 b=$3 start
  start=$(date +%s%N)
  "$gatedyno" versus "$folder/$a.db" "$folder/$b.db" --runs 1,1 \
    -o "$folder/versus/$name.html" >"$folder/versus/$name.txt"
  echo "versus/$name.html: $((($(date +%s%N) - start) / 1000000)) ms," \
    "$(stat -c %s "$folder/versus/$name.html") bytes"
  "$gatedyno" versus "$folder/$a.db" "$folder/$b.db" --runs 1,1 \
    --json "$folder/versus/$name.json" \
    --csv "$folder/versus/$name.csv" >/dev/null
}
for run in sample hostile large; do
  compare "$run" "$run" "${run}_b"
done
compare same sample sample
