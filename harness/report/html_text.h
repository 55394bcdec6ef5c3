// Text and hashes in the form that HTML wants them.

#ifndef GATEDYNO_REPORT_HTML_TEXT_H_
#define GATEDYNO_REPORT_HTML_TEXT_H_

#include <map>
#include <string>
#include <string_view>

namespace gatedyno {

// For element content and quoted attributes: & < > " ' become references, and
// control characters U+FFFD, the sign for what cannot be shown.
std::string Html(std::string_view text);

// A name of the user's within a sentence: escaped, and <bdi>, so that letters
// written from right to left do not turn the sentence round.
std::string HtmlName(std::string_view name);

// `html` with the blank before each % made one that no line breaks at.
std::string KeepPercents(std::string html);

// JSON for a <script> element, which ends at the first "</script" whatever
// JSON says: every < becomes \u003c.
std::string ScriptJson(std::string_view json);

// 'sha256-...' as a content security policy has it (W3C, Content Security
// Policy level 3, 2.3.1), from hexadecimal.
std::string PolicyHash(std::string_view sha256);

// `shell` with every {{name}} replaced by values.at("name"); what is put in is
// not looked at again.  REQUIRES: a value for every name.
std::string FillIn(std::string_view shell,
                   const std::map<std::string, std::string>& values);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_HTML_TEXT_H_
