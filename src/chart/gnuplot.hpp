#pragma once

#include <string>
#include <string_view>

#include "rainledger/chart/chart.hpp"

namespace rainledger {

/// Runs the gnuplot found on PATH over `script`, without a shell and without its start-up files.
/// The chart's bytes are what it wrote to standard output; with none, or where it failed, the
/// problem tells what it said.
[[nodiscard]] Chart run_gnuplot(std::string_view script);

}  // namespace rainledger
