// The manual page, made of the command table.

#ifndef GATEDYNO_CLI_MANUAL_H_
#define GATEDYNO_CLI_MANUAL_H_

#include <string>

#include <CLI/CLI.hpp>

namespace gatedyno {

// Section 1, in the man macros (man(7)); every command that is not hidden, with
// its options.
std::string ManualPage(const CLI::App& program, const std::string& version);

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_MANUAL_H_
