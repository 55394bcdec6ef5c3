#include "harness/node/model_text.h"

#include <sstream>

#include "harness/base/file.h"
#include "harness/base/text.h"

namespace gatedyno {
namespace {

constexpr std::string_view kBlank = " \t";

// The simulator strips blanks, and what ends a line on other systems.
std::string_view Trim(std::string_view line) {
  if (line.ends_with('\r')) {
    line.remove_suffix(1);
  }
  const size_t begin = line.find_first_not_of(kBlank);
  if (begin == std::string_view::npos) {
    return {};
  }
  return line.substr(begin, line.find_last_not_of(kBlank) - begin + 1);
}

// Takes the next word off `text`; quotes of either kind group.
std::string TakeWord(std::string_view& text) {
  text = Trim(text);
  if (text.empty()) {
    return "";
  }
  const char quote = text.front();
  const bool quoted = quote == '"' || quote == '\'';
  if (quoted) {
    text.remove_prefix(1);
  }
  const size_t end = quoted ? text.find(quote) : text.find_first_of(kBlank);
  std::string word(text.substr(0, end));
  text = end == std::string_view::npos ? std::string_view()
                                       : text.substr(end + (quoted ? 1 : 0));
  return word;
}

}  // namespace

Result<ModelText> ReadModelText(const std::filesystem::path& path) {
  Result<std::string> content = ReadFile(path);
  if (!content.ok()) {
    return Forward(content);
  }
  ModelText text{.path = path, .content = *std::move(content), .lines = {}};
  std::istringstream in(text.content);
  std::string line;
  for (int number = 1; std::getline(in, line); ++number) {
    const std::string_view trimmed = Trim(line);
    if (!trimmed.empty()) {
      text.lines.push_back({number, std::string(trimmed)});
    }
  }
  return text;
}

bool IsComment(std::string_view text) {
  return text.find_first_of("*$;") == 0 || text.starts_with("//");
}

std::vector<ModelLine> LogicalLines(const ModelText& text) {
  std::vector<ModelLine> logical;
  for (const ModelLine& line : text.lines) {
    if (IsComment(line.text)) {
      continue;
    }
    if (line.text.front() == '+' && !logical.empty()) {
      logical.back().text += " " + line.text.substr(1);
    } else {
      logical.push_back(line);
    }
  }
  return logical;
}

IncludeLine ParseInclude(std::string_view line) {
  const std::string command = ToLower(TakeWord(line));
  IncludeLine include;
  // The simulator takes any word that begins so.
  if (command.starts_with(".inc")) {
    include.file = TakeWord(line);
  } else if (command.starts_with(".lib")) {
    include.file = TakeWord(line);
    include.section = TakeWord(line);
    if (include.section.empty()) {
      return {};
    }
  }
  include.rest = Trim(line);
  return include;
}

}  // namespace gatedyno
