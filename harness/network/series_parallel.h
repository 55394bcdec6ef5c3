// Series/parallel form of a pull-up or pull-down network.
//
// Two-terminal reduction: parallel ways become one, then nets with two ways
// become one way in series, until one way is left (a bridge leaves more, and
// has no such form).

#ifndef GATEDYNO_NETWORK_SERIES_PARALLEL_H_
#define GATEDYNO_NETWORK_SERIES_PARALLEL_H_

#include <optional>
#include <string>
#include <vector>

#include "harness/network/rail_network.h"

namespace gatedyno {

struct SeriesParallel {
  enum class Form { kDevice, kSeries, kParallel };

  Form form = Form::kDevice;
  int index = -1;                     // Of the switch, for kDevice.
  std::vector<SeriesParallel> parts;  // In series: from the output to the rail.
};

// None for a network that is not series/parallel, or empty.
std::optional<SeriesParallel> ReduceSeriesParallel(const SwitchNetwork& network,
                                                   const RailNetwork& rail);

// Devices in series at most.
int Height(const SeriesParallel& tree);

// Series for parallel and parallel for series.
SeriesParallel DualOf(const SeriesParallel& tree);

// Equal for networks that differ only in the order of devices in series, in
// the order of parallel ways, or in polarity.
std::string CanonicalText(const SwitchNetwork& network,
                          const SeriesParallel& tree);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_SERIES_PARALLEL_H_
