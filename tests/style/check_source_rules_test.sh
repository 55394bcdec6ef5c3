#!/usr/bin/env bash
# Each rule of check_source_rules.sh fires, and only where it is broken.
set -u
check=$(dirname "$(readlink -f "$0")")/check_source_rules.sh
tree=$(mktemp -d)
trap 'rm -rf "$tree"' EXIT
failures=0

# write FILE TEXT: into the tree.
write() {
  mkdir -p "$tree/$(dirname "$1")"
  printf '%s\n' "$2" >"$tree/$1"
}

# A tree that breaks no rule, but looks at every one of them.
fresh_tree() {
  rm -rf "$tree/harness" "$tree/tests"
  write harness/base/text.h '#include <string>'
  write harness/sim/pool.cc '#include "harness/base/text.h"'
  write harness/sim/own.cc '#include "harness/sim/pool.h"'
  write harness/cli/main.cc '#include "harness/flow/plan.h"'
  write harness/store/store.cc '#include <sqlite3.h>'
  write harness/worker/session.cc '#include <ngspice/sharedspice.h>'
  write tests/base/text_test.cc '#include "tests/support/gates.h"'
  write harness/sim/notes.md '#include "pool.h" in a text that is no source'
}

# expect EXIT_CODE OUTPUT: of the check.
expect() {
  local output exit_code=0
  output=$(bash "$check" "$tree") || exit_code=$?
  if [[ $exit_code != "$1" || $output != "$2" ]]; then
    printf 'expected %s:\n%s\ngot %s:\n%s\n\n' "$1" "$2" "$exit_code" "$output"
    failures=$((failures + 1))
  fi
}

order='base record netlist network node effort deck sim worker store farm fit compare report page flow cli'

fresh_tree
expect 0 ''

fresh_tree
write harness/base/text.h $'#include <string>\n#include "harness/record/job.h"'
expect 1 "harness/base/text.h:2: may not include a higher layer (order: $order)"

fresh_tree
write harness/report/table.cc '#include "harness/flow/plan.h"'
expect 1 "harness/report/table.cc:1: may not include a higher layer (order: $order)"

fresh_tree
write harness/sim/pool.cc '#include "pool.h"'
expect 1 'harness/sim/pool.cc:1: include by full path from the repository root'

fresh_tree
write tests/sim/pool_test.cc '#include "gates.h"'
expect 1 'tests/sim/pool_test.cc:1: include by full path from the repository root'

fresh_tree
write harness/base/file.h '#include <string>'
write harness/base/file.cc $'// A file.\n#include <string>\n#include "harness/base/file.h"'
expect 1 'harness/base/file.cc:2: its own header comes first, which shows that it compiles alone'

fresh_tree
write harness/store/row.h '#include <sqlite3.h>'
expect 1 'harness/store/row.h:1: sqlite3.h belongs to harness/store/*.cc only'

fresh_tree
write harness/sim/pool.cc '#include <ngspice/sharedspice.h>'
expect 1 'harness/sim/pool.cc:1: ngspice headers belong to harness/worker/*.cc only'

fresh_tree
write harness/base/text.h '#include "harness/cli/main.h"'
write harness/fit/line.cc '#include "line.h"'
expect 1 "harness/base/text.h:1: may not include a higher layer (order: $order)
harness/fit/line.cc:1: include by full path from the repository root"

((failures == 0)) && echo "every rule fires"
exit $((failures > 0))
