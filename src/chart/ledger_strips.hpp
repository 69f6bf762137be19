#pragma once

#include <string_view>
#include <vector>

#include "chart/chart_units.hpp"
#include "chart/drawing.hpp"
#include "chart/loss_view.hpp"
#include "chart/time_axis.hpp"

// The strips of one surface's ledger, one above the other on a page, with words beside them.
namespace rainledger {

/// What the strips have in common.
struct LedgerStrips {
    const LossView& view;
    const ChartUnits& units;
    std::vector<StepRates> rates;
    std::vector<DrawnStep> drawn;
    TimeAxis time;

    /// The time axis without labels: they stand below the lowest strip.
    [[nodiscard]] Axis bare_time() const { return {0.0, time.span_h, time.ticks, false}; }
};

inline constexpr double kStripsLeft = 48.0;
inline constexpr double kStripsRight = 486.0;
inline constexpr double kStripTitleRise = 15.0;
inline constexpr double kBesideStrips = kStripsRight + 12.0;

/// What a strip shows and its unit, above it on the left.
void strip_title(Drawing& drawing, const Box& box, std::string_view words, std::string_view unit);

/// An ink, or a line, and what it means, beside the strips.
void key_swatch(Drawing& drawing, double y, std::string_view colour, std::string_view words);
void key_line(Drawing& drawing, double y, double width, bool dashed, std::string_view words);

/// What becomes of the supply, as rates, with the capacity.
void add_rates_strip(Drawing& drawing, const Box& box, const LedgerStrips& strips);

/// The accounts as they come together, stacked, with the time axis below.
void add_accounts_strip(Drawing& drawing, const Box& box, const LedgerStrips& strips);

}  // namespace rainledger
