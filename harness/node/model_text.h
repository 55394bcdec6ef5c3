// A model file as its lines, with the files it includes.

#ifndef GATEDYNO_NODE_MODEL_TEXT_H_
#define GATEDYNO_NODE_MODEL_TEXT_H_

#include <filesystem>
#include <string>
#include <string_view>
#include <vector>

#include "harness/base/result.h"

namespace gatedyno {

struct ModelLine {
  int number = 0;    // Counted from 1.
  std::string text;  // Without blanks at either end; never empty.
};

struct ModelText {
  std::filesystem::path path;
  std::string content;           // As stored.
  std::vector<ModelLine> lines;  // As stored, comments too.
};

// Reads the file; a failure names it.
Result<ModelText> ReadModelText(const std::filesystem::path& path);

// Whether the line is nothing but a comment: `*`, `$`, `;` or `//`.
bool IsComment(std::string_view text);

// Without comment lines, and with `+` lines joined to the line they continue
// by a blank.  The number is the first line's.
std::vector<ModelLine> LogicalLines(const ModelText& text);

// What an `.include FILE` or `.lib FILE SECTION` line names.
struct IncludeLine {
  std::string file;     // Empty: the line includes nothing.
  std::string section;  // Of `.lib` lines.
  std::string rest;     // What follows.
};

// `line` is a logical one.  The `.lib SECTION` that opens a section includes
// nothing; any second word, `$` or `;` too, is a section to the simulator.
IncludeLine ParseInclude(std::string_view line);

}  // namespace gatedyno

#endif  // GATEDYNO_NODE_MODEL_TEXT_H_
