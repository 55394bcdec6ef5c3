// The netlist reader on arbitrary bytes, with a kit's device and fins.

#include <cstddef>
#include <cstdint>

#include "harness/netlist/reader.h"
#include "tests/netlist/read_text.h"

extern "C" int LLVMFuzzerTestOneInput(const uint8_t* data, size_t size);

extern "C" int LLVMFuzzerTestOneInput(const uint8_t* data, size_t size) {
  gatedyno::ReaderOptions options = gatedyno::TestOptions();
  options.devices.push_back(gatedyno::KitDevice());
  options.fin_width_m = 50e-9;
  const auto* text = reinterpret_cast<const char*>(data);
  (void)gatedyno::ReadCells({text, size}, gatedyno::kFile, options);
  return 0;
}
