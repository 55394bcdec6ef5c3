#include "harness/flow/cell_set.h"

#include <algorithm>
#include <map>
#include <set>
#include <system_error>

#include <fmt/format.h>
#include <fmt/ranges.h>
#include <fnmatch.h>

#include "harness/base/install.h"
#include "harness/base/text.h"
#include "harness/netlist/reader.h"

namespace gatedyno {
namespace {

namespace fs = std::filesystem;

constexpr const char* kExtension = ".sp";

fs::path BuiltInFolder() {
  return DecksFolder() / "cells";
}

std::vector<fs::path> BuiltInMatches(const std::string& pattern) {
  std::vector<fs::path> files;
  for (const std::string& name : BuiltInCells()) {
    if (::fnmatch(pattern.c_str(), name.c_str(), 0) == 0) {
      files.push_back(BuiltInFolder() / (name + kExtension));
    }
  }
  return files;
}

Result<std::vector<fs::path>> FilesOf(const std::string& name,
                                      const fs::path& folder) {
  std::vector<fs::path> matches = BuiltInMatches(name);
  if (!matches.empty()) {
    return matches;
  }
  const fs::path path = folder / name;
  std::error_code ignored;
  if (fs::is_regular_file(path, ignored)) {
    return std::vector<fs::path>{path};
  }
  return BadInput(
      fmt::format("cell '{}': neither a netlist file nor a built-in cell ({})",
                  name,
                  fmt::join(BuiltInCells(), ", ")));
}

Status CheckNames(const std::vector<Cell>& cells) {
  std::map<std::string, const Cell*> seen;
  for (const Cell& cell : cells) {
    const auto [first, is_new] = seen.try_emplace(ToLower(cell.name), &cell);
    if (!is_new) {
      const SourcePlace& place = first->second->place;
      return BadInput(fmt::format("{}:{}: cell '{}' is also defined at {}:{}",
                                  cell.place.file,
                                  cell.place.line,
                                  cell.name,
                                  place.file,
                                  place.line));
    }
  }
  return Ok();
}

}  // namespace

std::vector<std::string> BuiltInCells() {
  std::vector<std::string> names;
  std::error_code ignored;
  for (const auto& entry : fs::directory_iterator(BuiltInFolder(), ignored)) {
    if (entry.path().extension() == kExtension) {
      names.push_back(entry.path().stem().string());
    }
  }
  std::sort(names.begin(), names.end());
  return names;
}

Result<std::vector<fs::path>> CellFiles(const std::vector<std::string>& names,
                                        const fs::path& folder) {
  std::vector<fs::path> files;
  std::set<fs::path> seen;
  for (const std::string& name : names) {
    Result<std::vector<fs::path>> found = FilesOf(name, folder);
    if (!found.ok()) {
      return found;
    }
    std::copy_if(
        found->begin(),
        found->end(),
        std::back_inserter(files),
        [&](const fs::path& file) { return seen.insert(file).second; });
  }
  return files;
}

Result<std::vector<Cell>> ReadCellSet(const std::vector<std::string>& names,
                                      const fs::path& folder,
                                      const ProcessNode& node) {
  const Result<std::vector<fs::path>> files = CellFiles(names, folder);
  if (!files.ok()) {
    return Forward(files);
  }
  const ReaderOptions options = ReaderOptionsOf(node);
  std::vector<Cell> cells;
  for (const fs::path& file : *files) {
    Result<std::vector<Cell>> read = ReadCellFile(file, options);
    if (!read.ok()) {
      return read;
    }
    std::move(read->begin(), read->end(), std::back_inserter(cells));
  }
  const Status unique = CheckNames(cells);
  if (!unique.ok()) {
    return Forward(unique);
  }
  return cells;
}

}  // namespace gatedyno
