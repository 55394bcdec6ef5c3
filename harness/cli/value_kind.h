// What a value on the command line is: the word for it in help and manual, and
// what a shell offers for it (option->type_name(kFile)).

#ifndef GATEDYNO_CLI_VALUE_KIND_H_
#define GATEDYNO_CLI_VALUE_KIND_H_

namespace gatedyno {

inline constexpr const char* kFile = "FILE";
inline constexpr const char* kFolder = "FOLDER";
inline constexpr const char* kNode = "NODE";
inline constexpr const char* kCorner = "CORNER";
inline constexpr const char* kCell = "CELL";
inline constexpr const char* kPlanOrCell = "PLAN|CELL";

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_VALUE_KIND_H_
