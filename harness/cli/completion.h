// What may stand next on the command line: for a shell's completion.
//
// The command table is the one source: commands, options and the kind of their
// values (cli/value_kind.h).  The shells' own scripts, in this folder, only ask
// `gatedyno complete` and show what it says.

#ifndef GATEDYNO_CLI_COMPLETION_H_
#define GATEDYNO_CLI_COMPLETION_H_

#include <string>
#include <vector>

#include <CLI/CLI.hpp>

namespace gatedyno {

// Names that a value may have beside files.
struct KnownNames {
  std::vector<std::string> nodes;
  std::vector<std::string> corners;
  std::vector<std::string> cells;
};

struct Completion {
  std::vector<std::string> words;  // In the order to be shown.
  bool files = false;              // Files may stand here too.
  bool folders = false;
};

// `words` follow the program's name; the last is the one being typed, and what
// is offered begins like it.  A "=" between an option and its value may be a
// word of its own, as bash splits them.
Completion Complete(const CLI::App& program,
                    const std::vector<std::string>& words,
                    const KnownNames& names);

// One word a line; ":files" or ":folders" as the last where they may stand.
std::string CompletionText(const Completion& completion);

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_COMPLETION_H_
