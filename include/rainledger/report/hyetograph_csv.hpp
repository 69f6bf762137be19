#pragma once

#include <string>

#include "rainledger/rain/hyetograph.hpp"

namespace rainledger {

/// A storm's own steps as hyetograph CSV: `start [min],end [min],depth [mm]` for elapsed times (in
/// the unit in which they were given), `start,end,depth [mm]` with ISO 8601 stamps. Numbers as the
/// shortest text that parses back to the same double; read back it gives the same steps, and
/// written again the same bytes.
[[nodiscard]] std::string hyetograph_csv(const Hyetograph& rain);

}  // namespace rainledger
