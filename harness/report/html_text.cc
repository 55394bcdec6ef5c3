#include "harness/report/html_text.h"

#include <algorithm>
#include <cassert>
#include <cstddef>
#include <cstdint>
#include <cstdlib>

#include <fmt/format.h>

namespace gatedyno {
namespace {

// Empty for what stays as it is.
std::string_view Reference(char c) {
  constexpr char kDelete = 0x7f;
  switch (c) {
    case '&':
      return "&amp;";
    case '<':
      return "&lt;";
    case '>':
      return "&gt;";
    case '"':
      return "&quot;";
    case '\'':
      return "&#39;";
    case '\n':
    case '\t':
      return "";
    default:
      return (c >= 0 && c < ' ') || c == kDelete ? "\xEF\xBF\xBD" : "";
  }
}

// Three bytes are four digits; '=' stands for the bytes that are missing.
std::string Base64OfHex(std::string_view hex) {
  constexpr std::string_view kDigits =
      "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789+/";
  constexpr size_t kHexDigits = 6;
  std::string text;
  for (; !hex.empty(); hex.remove_prefix(std::min(kHexDigits, hex.size()))) {
    std::string group(hex.substr(0, kHexDigits));
    const size_t digits = group.size() / 2 + 1;
    group.resize(kHexDigits, '0');
    const auto bits =
        static_cast<std::uint32_t>(std::strtoul(group.c_str(), nullptr, 16));
    for (size_t i = 0; i < 4; ++i) {
      text += i < digits ? kDigits[(bits >> (18 - 6 * i)) & 63U] : '=';
    }
  }
  return text;
}

}  // namespace

std::string Html(std::string_view text) {
  std::string html;
  html.reserve(text.size());
  for (const char c : text) {
    const std::string_view reference = Reference(c);
    reference.empty() ? html += c : html += reference;
  }
  return html;
}

std::string HtmlName(std::string_view name) {
  return fmt::format("<bdi>{}</bdi>", Html(name));
}

std::string KeepPercents(std::string html) {
  constexpr std::string_view kLoose = " %";
  constexpr std::string_view kKept = "&nbsp;%";
  size_t at = 0;
  while ((at = html.find(kLoose, at)) != std::string::npos) {
    html.replace(at, kLoose.size(), kKept);
    at += kKept.size();
  }
  return html;
}

std::string ScriptJson(std::string_view json) {
  std::string text;
  text.reserve(json.size());
  for (const char c : json) {
    c == '<' ? text += "\\u003c" : text += c;
  }
  return text;
}

std::string PolicyHash(std::string_view sha256) {
  return fmt::format("'sha256-{}'", Base64OfHex(sha256));
}

std::string FillIn(std::string_view shell,
                   const std::map<std::string, std::string>& values) {
  constexpr std::string_view kOpen = "{{";
  constexpr std::string_view kClose = "}}";
  std::string text;
  for (;;) {
    const size_t open = shell.find(kOpen);
    text += shell.substr(0, open);
    if (open == std::string_view::npos) {
      return text;
    }
    shell.remove_prefix(open + kOpen.size());
    const size_t close = shell.find(kClose);
    assert(close != std::string_view::npos);
    text += values.at(std::string(shell.substr(0, close)));
    shell.remove_prefix(close + kClose.size());
  }
}

}  // namespace gatedyno
