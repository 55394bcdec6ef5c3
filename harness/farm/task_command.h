// The shell text that Slurm runs for each task of an array.

#ifndef GATEDYNO_FARM_TASK_COMMAND_H_
#define GATEDYNO_FARM_TASK_COMMAND_H_

#include <string>

#include "harness/farm/round_folder.h"
#include "harness/farm/slurm_farm.h"

namespace gatedyno {

// "exec gatedyno task FOLDER ROUND INDEX --...", fit for any file name.  The
// index is Slurm's own, SLURM_ARRAY_TASK_ID.
std::string TaskShellText(const FarmOptions& options, const RoundFolder& round);

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_TASK_COMMAND_H_
