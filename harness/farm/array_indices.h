// The indices of a task array as Slurm's --array takes them: "0-3,7".

#ifndef GATEDYNO_FARM_ARRAY_INDICES_H_
#define GATEDYNO_FARM_ARRAY_INDICES_H_

#include <span>
#include <string>

namespace gatedyno {

// REQUIRES: `indices` ascend.
std::string ArrayIndices(std::span<const int> indices);

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_ARRAY_INDICES_H_
