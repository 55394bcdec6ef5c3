// Which words are names.

#ifndef GATEDYNO_NETLIST_NAME_H_
#define GATEDYNO_NETLIST_NAME_H_

#include <string>
#include <string_view>

#include "harness/netlist/lexer.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {

inline constexpr std::string_view kLettersAndDigits =
    "abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789";

// Letters, digits and '_', no digit first.
bool IsParameterName(std::string_view text);

// A net, device or subcircuit name as written: letters, digits and the
// punctuation that extraction tools and buses use ("x1/net3", "req<0>").
// `kind` is what the message calls it.
Parsed<std::string> ParseName(const Token& token, std::string_view kind);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_NAME_H_
