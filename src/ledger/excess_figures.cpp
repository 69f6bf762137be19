#include "ledger/excess_figures.hpp"

#include <algorithm>
#include <cstddef>

#include "rainledger/rain/rain_windows.hpp"

namespace rainledger {
namespace {

constexpr double kMmM2PerM3 = 1000.0;          // 1 mm over 1 m2 is 1/1000 m3
constexpr double kMmM2PerHourPerLps = 3600.0;  // 1 mm/h over 1 m2 is 1/3600 L/s

}  // namespace

ExcessFigures excess_figures(std::span<const LedgerRow> rows, const Accounts& total, double area_m2,
                             const Hyetograph& rain) {
    ExcessFigures out;
    out.excess_volume_m3 = total.excess_mm * area_m2 / kMmM2PerM3;
    if (total.rain_mm > 0.0) out.volumetric_runoff_coefficient = total.excess_mm / total.rain_mm;
    CumulativeDepth excess(rows.size());
    for (std::size_t step = 0; step < rows.size(); ++step) {
        const double excess_mm = rows[step].accounts.excess_mm;
        out.peak_excess_mm_per_h =
            std::max(out.peak_excess_mm_per_h, excess_mm / rain.duration_h[step]);
        excess.add_step(rain.duration_h[step], excess_mm);
    }
    for (std::size_t i = 0; i < kWindowsMinutes.size(); ++i) {
        const double window_h = kWindowsMinutes[i] / 60.0;
        out.worst_flow_l_per_s[i] =
            excess.largest_depth_mm(window_h) / window_h * area_m2 / kMmM2PerHourPerLps;
    }
    return out;
}

}  // namespace rainledger
