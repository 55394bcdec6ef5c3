// What may stand in a model file.
//
// A deck includes model files as they are, and the simulator runs what they
// say: a `.control` block can run commands of the machine.  So a model file
// may hold only definitions (model_rules.h), and include only files of its own
// folder and below, without symbolic links, unless the node says
// "trusted_models": true.  A file changed after the check is not noticed.

#ifndef GATEDYNO_NODE_MODEL_CHECK_H_
#define GATEDYNO_NODE_MODEL_CHECK_H_

#include <string>

#include "harness/base/result.h"
#include "harness/node/process_node.h"

namespace gatedyno {

// Reads every model file of every process, and what they include.  Fails with
// file:line and the line on the first that is refused.
Status CheckModels(const ProcessNode& node);

// Fingerprint over the content of the models of one process, included files
// too: what a job's key depends on.
Result<std::string> ModelsFingerprint(const Process& process);

}  // namespace gatedyno

#endif  // GATEDYNO_NODE_MODEL_CHECK_H_
