#!/usr/bin/env bash
# make_waves.sh FOLDER GATEDYNO: pages with waveforms, of a small run made here
# and of the run with hostile names that make_reports.sh has put into FOLDER.
set -euo pipefail
folder=$1 gatedyno=$2
mkdir -p "$folder/waves"
rm -f "$folder"/waves/real.db*
# Beyond what is allowed is no failure here.
"$gatedyno" run nand2 xor2 --fanouts 1,2,4 --store "$folder/waves/real.db" \
  >"$folder/waves/run.txt" 2>&1 || [[ $? -eq 1 ]]
for run in real hostile; do
  store=$folder/$run.db
  [[ $run == hostile ]] || store=$folder/waves/$run.db
  start=$(date +%s%N)
  "$gatedyno" report "$store" -o "$folder/waves/$run.html" --waves 20 |
    grep waveforms
  echo "waves/$run.html: $((($(date +%s%N) - start) / 1000000)) ms," \
    "$(stat -c %s "$folder/waves/$run.html") bytes"
done
