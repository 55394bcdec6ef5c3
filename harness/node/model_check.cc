#include "harness/node/model_check.h"

#include <functional>
#include <set>
#include <string_view>
#include <system_error>
#include <vector>

#include <fmt/format.h>

#include "harness/base/fingerprint.h"
#include "harness/node/model_rules.h"
#include "harness/node/model_text.h"

namespace gatedyno {
namespace {

namespace fs = std::filesystem;

// Calls `visit` for the file and every file it includes, each once.
Status VisitFiles(const fs::path& root,
                  const std::function<Status(const ModelText&)>& visit) {
  std::vector<fs::path> open = {root};
  std::set<fs::path> seen = {root};
  while (!open.empty()) {
    const fs::path path = open.back();
    open.pop_back();
    const Result<ModelText> text = ReadModelText(path);
    if (!text.ok()) {
      return Forward(text);
    }
    Status visited = visit(*text);
    if (!visited.ok()) {
      return visited;
    }
    for (const ModelLine& line : LogicalLines(*text)) {
      const std::string file = ParseInclude(line.text).file;
      const fs::path next = (path.parent_path() / file).lexically_normal();
      if (!file.empty() && seen.insert(next).second) {
        open.push_back(next);
      }
    }
  }
  return Ok();
}

// REQUIRES: `root` is canonical.  A link could lead out of the folder, or make
// the simulator start from another folder than this check.
std::string WhyPlaceRefused(const fs::path& root,
                            const fs::path& from,
                            const std::string& file) {
  if (file.empty()) {
    return "";
  }
  const fs::path target = (from.parent_path() / file).lexically_normal();
  const fs::path relative = target.lexically_relative(root.parent_path());
  if (relative.empty() || *relative.begin() == "..") {
    return fmt::format("'{}' lies outside the model's folder", file);
  }
  std::error_code failed;
  return fs::weakly_canonical(target, failed) == target
             ? ""
             : fmt::format("'{}' is a symbolic link", file);
}

// A hostile line must not reach the terminal as it is.
std::string Printable(std::string_view text) {
  std::string printable;
  for (const char c : text) {
    printable += c >= ' ' && c <= '~' ? c : '?';
  }
  return printable;
}

Status Refuse(const ModelText& text,
              const ModelLine& line,
              std::string_view why) {
  return BadInput(fmt::format(
      "{}:{}: refused in a model file: {}; \"trusted_models\": true in the "
      "node file lets it through\n{}",
      text.path.string(),
      line.number,
      why,
      Printable(line.text)));
}

Status CheckText(const fs::path& root, const ModelText& text) {
  bool continues = false;
  for (const ModelLine& line : text.lines) {
    const std::string why = WhyLineRefused(line.text, continues);
    if (!why.empty()) {
      return Refuse(text, line, why);
    }
    continues = continues || !IsComment(line.text);
  }
  for (const ModelLine& line : LogicalLines(text)) {
    const std::string why = WhyStatementRefused(line.text);
    const std::string why_place =
        WhyPlaceRefused(root, text.path, ParseInclude(line.text).file);
    if (!why.empty() || !why_place.empty()) {
      return Refuse(text, line, why.empty() ? why_place : why);
    }
  }
  return Ok();
}

// The deck names the file itself.  The simulator cuts an .include line at `;`
// and at `$` after a blank, and a .lib line at any blank or quote too.
Status CheckPath(const ModelFile& model) {
  const std::string path = model.path.string();
  for (size_t i = 0; i < path.size(); ++i) {
    const bool after_blank = i > 0 && path[i - 1] == ' ';
    const bool cut = path[i] == ';' || path[i] == '"' ||
                     (path[i] == '$' && after_blank) ||
                     (path[i] >= 0 && path[i] < ' ');
    const bool cut_in_lib = path[i] == ' ' || path[i] == '\'';
    if (cut || (cut_in_lib && !model.section.empty())) {
      return BadInput(fmt::format(
          "{}: the simulator cannot read a {}with '{}' in its path: move it",
          Printable(path),
          model.section.empty() ? "model file " : "library's section ",
          Printable(path.substr(i, 1))));
    }
  }
  return Ok();
}

}  // namespace

Status CheckModels(const ProcessNode& node) {
  std::set<fs::path> checked;
  for (const Process& process : node.processes) {
    for (const ModelFile& model : process.models) {
      Status path = CheckPath(model);
      if (!path.ok()) {
        return path;
      }
      if (!checked.insert(model.path).second) {
        continue;
      }
      Status status = VisitFiles(model.path, [&](const ModelText& text) {
        return node.trusted_models ? Ok() : CheckText(model.path, text);
      });
      if (!status.ok()) {
        return status;
      }
    }
  }
  return Ok();
}

Result<std::string> ModelsFingerprint(const Process& process) {
  std::string all;
  for (const ModelFile& model : process.models) {
    const Status status = VisitFiles(model.path, [&](const ModelText& text) {
      all += Fingerprint(text.content);
      return Ok();
    });
    if (!status.ok()) {
      return Forward(status);
    }
    all += model.section;
  }
  return Fingerprint(all);
}

}  // namespace gatedyno
