#include "ledger/excess_figures.hpp"

#include <algorithm>
#include <cstddef>
#include <vector>

namespace rainledger {
namespace {

/// Cumulative excess at any time, from its values at the step edges; constant outside the record.
class ExcessCurve {
public:
    ExcessCurve(std::span<const LedgerRow> rows, const Hyetograph& rain) {
        time_h_.reserve(rows.size() + 1);
        depth_mm_.reserve(rows.size() + 1);
        time_h_.push_back(0.0);
        depth_mm_.push_back(0.0);
        for (std::size_t step = 0; step < rows.size(); ++step) {
            time_h_.push_back(time_h_.back() + rain.duration_h[step]);
            depth_mm_.push_back(depth_mm_.back() + rows[step].accounts.excess_mm);
        }
    }

    /// Largest depth in any window of `window_h`. The depth in a sliding window is piecewise
    /// linear, so its largest value is met with the window's start or end on a step edge.
    [[nodiscard]] double worst_depth_mm(double window_h) const {
        double worst = 0.0;
        std::size_t after = 0;
        std::size_t before = 0;
        for (std::size_t i = 0; i < time_h_.size(); ++i) {
            const double from_here = depth_at(time_h_[i] + window_h, after) - depth_mm_[i];
            const double to_here = depth_mm_[i] - depth_at(time_h_[i] - window_h, before);
            worst = std::max({worst, from_here, to_here});
        }
        return worst;
    }

private:
    /// `step` remembers where the last look-up ended; times only rise.
    [[nodiscard]] double depth_at(double time_h, std::size_t& step) const {
        if (time_h <= 0.0) return 0.0;
        if (time_h >= time_h_.back()) return depth_mm_.back();
        while (time_h_[step + 1] < time_h)
            ++step;
        const double share = (time_h - time_h_[step]) / (time_h_[step + 1] - time_h_[step]);
        return depth_mm_[step] + share * (depth_mm_[step + 1] - depth_mm_[step]);
    }

    std::vector<double> time_h_;
    std::vector<double> depth_mm_;
};

constexpr double kMmM2PerM3 = 1000.0;          // 1 mm over 1 m2 is 1/1000 m3
constexpr double kMmM2PerHourPerLps = 3600.0;  // 1 mm/h over 1 m2 is 1/3600 L/s

}  // namespace

ExcessFigures excess_figures(std::span<const LedgerRow> rows, const Accounts& total, double area_m2,
                             const Hyetograph& rain) {
    ExcessFigures out;
    out.excess_volume_m3 = total.excess_mm * area_m2 / kMmM2PerM3;
    if (total.rain_mm > 0.0) out.volumetric_runoff_coefficient = total.excess_mm / total.rain_mm;
    for (std::size_t step = 0; step < rows.size(); ++step)
        out.peak_excess_mm_per_h = std::max(out.peak_excess_mm_per_h,
                                            rows[step].accounts.excess_mm / rain.duration_h[step]);
    const ExcessCurve curve(rows, rain);
    for (std::size_t i = 0; i < kWindowsMinutes.size(); ++i) {
        const double window_h = kWindowsMinutes[i] / 60.0;
        out.worst_flow_l_per_s[i] =
            curve.worst_depth_mm(window_h) / window_h * area_m2 / kMmM2PerHourPerLps;
    }
    return out;
}

}  // namespace rainledger
