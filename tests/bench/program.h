// The built program as a user calls it, in words for the shell.

#ifndef GATEDYNO_TESTS_BENCH_PROGRAM_H_
#define GATEDYNO_TESTS_BENCH_PROGRAM_H_

#include <filesystem>
#include <string>

namespace gatedyno {

// `gatedyno run` on a store that was not there before: report in NAME.txt,
// result in NAME.json, store in NAME.db of `folder`.
std::string FreshRun(const std::filesystem::path& folder,
                     const std::string& name,
                     const std::string& arguments);

// `gatedyno deck`.
std::string DeckCommand(const std::filesystem::path& folder,
                        const std::string& arguments);

// The built-in plan.
std::filesystem::path ArbiterPlan();

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_BENCH_PROGRAM_H_
