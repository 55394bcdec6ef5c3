#include "harness/node/model_rules.h"

#include <algorithm>
#include <array>
#include <span>
#include <vector>

#include <fmt/format.h>

#include "harness/base/text.h"

namespace gatedyno {
namespace {

constexpr std::string_view kLetters = "abcdefghijklmnopqrstuvwxyz";
constexpr std::string_view kPathLetters =
    "abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789_.+-/";

// Commands that define and nothing else.
constexpr auto kDefinitions = std::to_array<std::string_view>({".model",
                                                               ".subckt",
                                                               ".ends",
                                                               ".param",
                                                               ".func",
                                                               ".include",
                                                               ".inc",
                                                               ".lib",
                                                               ".endl",
                                                               ".option",
                                                               ".options",
                                                               ".if",
                                                               ".elseif",
                                                               ".else",
                                                               ".endif",
                                                               ".global",
                                                               ".end"});

// Models that compute currents and charges.  The code models (a line `a...`)
// and the numerical devices open files.
constexpr auto kModelTypes = std::to_array<std::string_view>({"nmos",
                                                              "pmos",
                                                              "d",
                                                              "npn",
                                                              "pnp",
                                                              "njf",
                                                              "pjf",
                                                              "r",
                                                              "res",
                                                              "c",
                                                              "cap",
                                                              "l",
                                                              "ind"});

// First letters of devices; without code models, OSDI and logic primitives.
constexpr std::string_view kDevices = "bcdefghijklmqrvx";

// Options that say what units the models are in.  Tolerances and temperature
// are the deck's; any other option is a variable the simulator obeys.
constexpr auto kOptions = std::to_array<std::string_view>({"scale",
                                                           "scalm",
                                                           "tnom",
                                                           "wnflag",
                                                           "parhier",
                                                           "defad",
                                                           "defas",
                                                           "defpd",
                                                           "defps",
                                                           "defl",
                                                           "defw"});

bool IsOneOf(std::string_view word, std::span<const std::string_view> list) {
  return std::find(list.begin(), list.end(), word) != list.end();
}

std::vector<std::string> Words(std::string_view text, const char* separators) {
  std::vector<std::string> words;
  size_t begin = text.find_first_not_of(separators);
  while (begin != std::string_view::npos) {
    const size_t end = text.find_first_of(separators, begin);
    words.push_back(ToLower(text.substr(begin, end - begin)));
    begin = text.find_first_not_of(separators, end);
  }
  return words;
}

// ".if" of ".if(x == 1)".
std::string CommandOf(std::string_view statement) {
  return ToLower(statement.substr(0, statement.find_first_of(" \t(")));
}

std::string WhyCharactersRefused(std::string_view text, bool comment) {
  for (const char c : text) {
    const auto byte = static_cast<unsigned char>(c);
    constexpr unsigned char kDelete = 0x7f;
    if ((byte < ' ' && c != '\t') || byte == kDelete) {
      return fmt::format("control character 0x{:02x}", byte);
    }
    if (byte > kDelete && !comment) {
      return "a character outside ASCII, in a line that is no comment";
    }
  }
  return text.ends_with('\\')
             ? "the backslash at its end may join it with the next line"
             : "";
}

// After the `*`, or what the simulator makes a `*` of.
std::string WhyCommentRefused(std::string_view text) {
  const size_t first = text.find_first_not_of("*$;/");
  return first != std::string_view::npos && text[first] == '#'
             ? "a comment that begins '*#' is a command to the simulator"
             : "";
}

std::string WhyModelRefused(std::string_view statement) {
  constexpr size_t kType = 2;  // After .model NAME.
  const std::vector<std::string> words = Words(statement, " \t,=()");
  if (words.size() <= kType) {
    return "it names no type of model";
  }
  return IsOneOf(words[kType], kModelTypes)
             ? ""
             : fmt::format("models of type '{}' may read and write files",
                           words[kType]);
}

std::string WhyOptionsRefused(std::string_view statement) {
  std::string spaced;
  for (const char c : statement) {
    spaced += c == '=' ? std::string(" = ") : std::string(1, c);
  }
  const std::vector<std::string> words = Words(spaced, " \t,");
  for (size_t i = 1; i < words.size(); ++i) {
    if (!IsOneOf(words[i], kOptions)) {
      return fmt::format("option '{}' is not for models to set", words[i]);
    }
    if (i + 1 < words.size() && words[i + 1] == "=") {
      i += 2;
    }
  }
  return "";
}

std::string WhyIncludeRefused(std::string_view statement) {
  const IncludeLine include = ParseInclude(statement);
  for (const std::string& word : {include.file, include.section}) {
    if (word.find_first_not_of(kPathLetters) != std::string::npos) {
      return fmt::format(
          "'{}' has other characters than letters, digits and _.+-/", word);
    }
  }
  const bool may_end_with_comment = include.section.empty();
  const bool is_comment =
      include.rest.starts_with("$ ") || include.rest.starts_with("; ");
  return include.rest.empty() || (may_end_with_comment && is_comment)
             ? ""
             : fmt::format("'{}' is too much on its line", include.rest);
}

}  // namespace

std::string WhyLineRefused(std::string_view text, bool continues) {
  const bool comment = IsComment(text);
  if (std::string why = WhyCharactersRefused(text, comment); !why.empty()) {
    return why;
  }
  if (comment) {
    return WhyCommentRefused(text);
  }
  const char first = ToLower(text.substr(0, 1)).front();
  if (first == '+') {
    return continues ? "" : "there is nothing that '+' continues";
  }
  if (first == '.') {
    const std::string command = CommandOf(text);
    return IsOneOf(command, kDefinitions)
               ? ""
               : fmt::format("'{}' does not define a device", command);
  }
  if (kDevices.find(first) != std::string_view::npos) {
    return "";
  }
  return kLetters.find(first) == std::string_view::npos
             ? fmt::format("'{}' begins no definition", first)
             : fmt::format("devices '{}' are not for model files", first);
}

std::string WhyStatementRefused(std::string_view statement) {
  const std::string command = CommandOf(statement);
  if (command == ".model") {
    return WhyModelRefused(statement);
  }
  if (command == ".option" || command == ".options") {
    return WhyOptionsRefused(statement);
  }
  return command == ".include" || command == ".inc" || command == ".lib"
             ? WhyIncludeRefused(statement)
             : "";
}

}  // namespace gatedyno
