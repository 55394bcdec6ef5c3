#include "harness/netlist/reader.h"

#include <cstddef>
#include <utility>

#include <fmt/format.h>

#include "harness/base/file.h"
#include "harness/netlist/flatten.h"
#include "harness/netlist/hierarchy.h"
#include "harness/netlist/parse_error.h"
#include "harness/netlist/parser.h"
#include "harness/netlist/source_text.h"
#include "harness/netlist/supplies.h"

namespace gatedyno {
namespace {

// Columns and lines are ints; no cell file comes near.
constexpr size_t kLargestText = size_t{64} << 20;

ParseStatus CheckIsText(const SourceText& source) {
  for (int line = 1; line <= source.line_count(); ++line) {
    const size_t zero = source.Line(line).find('\0');
    if (zero != std::string_view::npos) {
      return Complain({line, static_cast<int>(zero) + 1},
                      "a zero byte: this is no text file");
    }
  }
  return std::monostate{};
}

Parsed<std::vector<Cell>> ReadSource(const SourceText& source,
                                     const ReaderOptions& options) {
  if (const ParseStatus text = CheckIsText(source); !text.ok()) {
    return Forward(text);
  }
  const Parsed<Netlist> netlist = ParseNetlist(source, options);
  if (!netlist.ok()) {
    return Forward(netlist);
  }
  const auto tops = FindTopCells(*netlist, options);
  if (!tops.ok()) {
    return Forward(tops);
  }
  return FlattenCells(source.file_name(), *netlist, *tops, options);
}

}  // namespace

Result<std::vector<Cell>> ReadCells(std::string_view text,
                                    const std::string& file_name,
                                    const ReaderOptions& options) {
  if (text.size() > kLargestText) {
    return BadInput(
        fmt::format("{}: larger than 64 MiB, no cell file", file_name));
  }
  const SourceText source(text, file_name);
  Parsed<std::vector<Cell>> cells = ReadSource(source, options);
  if (!cells.ok()) {
    return BadInput(WordParseError(cells.error(), source));
  }
  return *std::move(cells);
}

Result<std::vector<Cell>> ReadCellFile(const std::filesystem::path& path,
                                       const ReaderOptions& options) {
  const Result<std::string> text = ReadFile(path);
  if (!text.ok()) {
    return Forward(text);
  }
  return ReadCells(*text, path.string(), options);
}

}  // namespace gatedyno
