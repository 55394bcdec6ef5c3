// A netlist's text by lines, for reading it and for showing where it is wrong.

#ifndef GATEDYNO_NETLIST_SOURCE_TEXT_H_
#define GATEDYNO_NETLIST_SOURCE_TEXT_H_

#include <string>
#include <string_view>
#include <vector>

namespace gatedyno {

// Lines and columns count from 1; a column is a byte.
struct SourcePosition {
  int line = 1;
  int column = 1;
};

class SourceText {
 public:
  // `text` must outlive this object.  Line ends are "\n" or "\r\n"; the last
  // line may have none.  A UTF-8 byte order mark at the start is left out.
  SourceText(std::string_view text, std::string file_name);

  const std::string& file_name() const { return file_name_; }
  int line_count() const { return static_cast<int>(lines_.size()); }
  // Without its line end; empty for a number outside 1..line_count().
  std::string_view Line(int number) const;

 private:
  std::string file_name_;
  std::vector<std::string_view> lines_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_SOURCE_TEXT_H_
