#pragma once

#include <cstddef>
#include <span>
#include <string>
#include <vector>

#include "chart/chart_units.hpp"
#include "chart/time_axis.hpp"
#include "rainledger/report/fit_report.hpp"

// A field test ready to be drawn, in ink or in characters.
namespace rainledger {

/// A reading.
struct FitMark {
    std::size_t pit = 0;
    double start_h = 0.0;
    double middle_h = 0.0;
    double end_h = 0.0;
    double rate_mm_per_h = 0.0;
    double depth_mm = 0.0;     ///< on the scale of the curves, which begin at the earliest from_h
    double residual_mm = 0.0;  ///< from the best law; 0 where there is none
};

struct FitView {
    std::vector<const LawFit*> laws;  ///< those fitted, the best first
    std::vector<FitMark> marks;
    std::vector<std::string> pits;  ///< their names
    TimeAxis time;                  ///< from the start of the test
    double rates_top = 0.0;         ///< mm/h: what the axis of rates holds
    double depths_top = 0.0;        ///< mm
    double residuals_top = 0.0;     ///< mm: the largest, whatever its sign, that is drawn
    std::string rates_words;        ///< what the rates are
    std::string words;              ///< readings, and how well the best law fits
};

/// `shown` outlives the view. The time axis has at most `most_ticks` ticks.
[[nodiscard]] FitView fit_view(const ShownFit& shown, const ChartUnits& units, int most_ticks);

/// "RMSE 0.18 mm".
[[nodiscard]] std::string error_words(const LawFit& fit, const ChartUnits& units);

/// A curve's depth at a time, between its points.
[[nodiscard]] double curve_depth_mm(std::span<const CurvePoint> curve, double time_h);
/// A curve's rate likewise; infinite before the first finite one.
[[nodiscard]] double curve_rate_mm_per_h(std::span<const CurvePoint> curve, double time_h);

}  // namespace rainledger
