// Which lines of a model file the simulator can be trusted with.
//
// A list of what is allowed, not of what is known to be harmful.  Each rule
// answers something ngspice 39 was seen to do (tests/node/model_check_test.cc
// has the inputs): it runs the commands of `.control` blocks and of comments
// that begin `*#`, turns odd first characters (`$`, `;`, `=`, ...) into `*`,
// drops carriage returns inside a line, takes `.incx` for `.include`, expands
// `~/`, and lets some device models read and write files of their choice.

#ifndef GATEDYNO_NODE_MODEL_RULES_H_
#define GATEDYNO_NODE_MODEL_RULES_H_

#include <string>
#include <string_view>

#include "harness/node/model_text.h"

namespace gatedyno {

// Why a stored line is refused; empty when it is not.  `continues` tells
// whether a line that `+` can continue precedes it.
std::string WhyLineRefused(std::string_view text, bool continues);

// Why a logical line is refused, given that its stored lines are not.
std::string WhyStatementRefused(std::string_view statement);

}  // namespace gatedyno

#endif  // GATEDYNO_NODE_MODEL_RULES_H_
