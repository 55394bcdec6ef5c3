// The parameters of one scope, evaluated when first asked for.
//
// Names resolve here, then in the enclosing scope: the .subckt's parameters,
// then the file's, then the node's.  The caller's parameters are not visible
// inside a .subckt; an X line passes values.  Definitions may stand in any
// order.

#ifndef GATEDYNO_NETLIST_SCOPE_H_
#define GATEDYNO_NETLIST_SCOPE_H_

#include <map>
#include <string>
#include <vector>

#include "harness/netlist/definition.h"
#include "harness/netlist/expression.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {

class Scope : public ParameterSource {
 public:
  // `enclosing`, null for none, must outlive this scope.
  explicit Scope(Scope* enclosing) : enclosing_(enclosing) {}

  // An earlier definition of the same name in this scope wins.
  void Define(const std::string& name, double value);
  // `definition` must outlive this scope.
  void Define(const ParameterDefinition& definition);

  Parsed<double> Find(const std::string& name,
                      SourcePosition position) override;

  // Finds what Find would complain of, used or not.
  ParseStatus CheckAll();

 private:
  enum class State { kWaiting, kBusy, kKnown };
  struct Entry {
    State state = State::kWaiting;
    double value = 0.0;
    const Value* definition = nullptr;
  };

  Parsed<double> Settle(const std::string& name,
                        Entry& entry,
                        SourcePosition position);
  std::vector<std::string> Names() const;

  Scope* enclosing_;
  std::map<std::string, Entry> entries_;
  int depth_ = 0;
};

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_SCOPE_H_
