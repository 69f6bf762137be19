#pragma once

#include "rainledger/chart/chart.hpp"
#include "rainledger/report/fit_report.hpp"

namespace rainledger {

/// A field test: cumulative depth and rates by time with the fitted curve of each law, and the
/// residuals below; several pits as points of their own with the curves of all together.
[[nodiscard]] Chart fit_chart(const ShownFit& shown, const ChartOptions& options);

}  // namespace rainledger
