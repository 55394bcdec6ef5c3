#!/usr/bin/env bash
# make_reports.sh FOLDER GATEDYNO PAGE_STORES: every format of every run of
# runs.h, as a user would make them.
set -euo pipefail
folder=$1 gatedyno=$2 page_stores=$3
"$page_stores" "$folder"
for run in sample hostile large empty; do
  start=$(date +%s%N)
  "$gatedyno" report "$folder/$run.db" -o "$folder/$run.html"
  echo "$run.html: $((($(date +%s%N) - start) / 1000000)) ms," \
    "$(stat -c %s "$folder/$run.html") bytes"
  "$gatedyno" report "$folder/$run.db" --json "$folder/$run.json" \
    --csv "$folder/$run.csv" --junit "$folder/$run.xml" \
    --markdown "$folder/$run.md" >"$folder/$run.txt"
done
