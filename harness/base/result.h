// Result<T>: a value, or the reason there is none.
//
// Expected failures travel as Result; our own bugs are asserts.  An Error's
// message is one line, lower case, without a full stop, and names the file,
// line or option and what to do; a message about an input may carry the input
// line and a caret below it.

#ifndef GATEDYNO_BASE_RESULT_H_
#define GATEDYNO_BASE_RESULT_H_

#include <string>
#include <utility>
#include <variant>

#include <tl/expected.hpp>

namespace gatedyno {

// Whose fault it is; decides the program's exit code.
enum class ErrorKind {
  kBadInput,     // A netlist, node, plan or option is wrong.
  kUnavailable,  // The system refused: a file, a process, a lock.
  kInternal,     // Ours.
};

struct Error {
  ErrorKind kind = ErrorKind::kInternal;
  std::string message;
};

template <class T>
class [[nodiscard]] Result : public tl::expected<T, Error> {
 public:
  using tl::expected<T, Error>::expected;

  bool ok() const { return this->has_value(); }
};

inline tl::unexpected<Error> BadInput(std::string message) {
  return tl::unexpected<Error>({ErrorKind::kBadInput, std::move(message)});
}
inline tl::unexpected<Error> Unavailable(std::string message) {
  return tl::unexpected<Error>({ErrorKind::kUnavailable, std::move(message)});
}
inline tl::unexpected<Error> Internal(std::string message) {
  return tl::unexpected<Error>({ErrorKind::kInternal, std::move(message)});
}
// Passes the failure of one Result on as the failure of another.
template <class T>
tl::unexpected<Error> Forward(const Result<T>& failed) {
  return tl::unexpected<Error>(failed.error());
}

// The outcome of something that returns nothing else.
using Status = Result<std::monostate>;
inline Status Ok() {
  return std::monostate{};
}

}  // namespace gatedyno

#endif  // GATEDYNO_BASE_RESULT_H_
