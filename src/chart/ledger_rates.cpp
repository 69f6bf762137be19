#include <algorithm>
#include <cmath>
#include <string>
#include <utility>

#include "chart/ledger_strips.hpp"
#include "chart/page.hpp"
#include "chart/supply_strip.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

/// The capacity at the end of each drawn step, where there is one to speak of.
struct Capacity {
    std::string rows;
    double least = kNever;
    double most = 0.0;
};

Capacity capacity_line(const LedgerStrips& strips) {
    Capacity out;
    for (const DrawnStep& step : strips.drawn) {
        const double at_end = strips.units.shown(strips.view.rows[step.last].capacity_mm_per_h);
        if (!std::isfinite(at_end)) {
            if (!out.rows.empty()) out.rows += '\n';
            continue;
        }
        append_row(out.rows, {step.to_h, at_end});
        out.least = std::min(out.least, at_end);
        out.most = std::max(out.most, at_end);
    }
    return out;
}

/// The axis holds the supply and the infiltration; of a capacity above them it shows no more than
/// a quarter, and the line leaves the panel.
double rates_top(const LedgerStrips& strips, const Capacity& capacity) {
    constexpr double kRoomForCapacity = 1.25;
    double most = peak_supply(strips.rates);
    for (const StepRates& rate : strips.rates)
        most = std::max(most, rate.infiltrated);
    if (most <= 0.0) return capacity.most;
    return std::max(most, std::min(capacity.most, kRoomForCapacity * most));
}

std::vector<Layer> rate_layers(const Box& box, const LedgerStrips& strips) {
    const double width = outline_width(box, strips.drawn);
    const auto rate = [&](const DrawnStep& step) -> const StepRates& {
        return strips.rates[step.step];
    };
    const auto axis = [](const DrawnStep& /*step*/) { return 0.0; };
    const auto infiltrated = [&](const DrawnStep& s) { return rate(s).infiltrated; };
    const auto with_initial = [&](const DrawnStep& s) {
        return rate(s).infiltrated + rate(s).initial_loss;
    };
    const auto all_kept = [&](const DrawnStep& s) { return kept(rate(s)); };
    const auto all = [&](const DrawnStep& s) { return kept(rate(s)) + rate(s).excess; };
    return {stepped_area(strips.drawn, axis, infiltrated, kInfiltrated),
            stepped_area(strips.drawn, infiltrated, with_initial, kInitialLoss),
            stepped_area(strips.drawn, with_initial, all_kept, kPonded),
            stepped_area(strips.drawn, all_kept, all, kExcess),
            stepped_line(strips.drawn, all, kAxis, std::min(width, kThinLine)),
            stepped_line(strips.drawn, infiltrated, kInfiltration, width)};
}

/// What the inks and lines mean; a capacity that is above the scale throughout is told in words.
void rates_key(Drawing& drawing, const Box& box, const LedgerStrips& strips,
               const Capacity& capacity, bool shown) {
    double y = box.top - 8.0;
    constexpr double kBetweenKeys = 16.0;
    if (capacity.most > 0.0) {
        key_line(drawing, y, kDashedLine, true, "capacity");
        if (!shown) {
            drawing.text(kBesideStrips + 15.0, y - 14.0,
                         three_figures(capacity.least) + " " +
                             std::string(strips.units.rate_unit()) + " or more",
                         {kQuiet, kTextSize - 1.0});
            y -= 14.0;
        }
        y -= kBetweenKeys;
    }
    const Accounts& total = strips.view.total;
    if (total.infiltrated_mm > 0.0) {
        key_line(drawing, y, kLine, false, "infiltration");
        y -= kBetweenKeys;
    }
    if (total.rain_mm > 0.0 && strips.view.surface->depression_storage_mm > 0.0) {
        key_swatch(drawing, y, kPonded, "into storage");
        y -= kBetweenKeys;
    }
    if (total.excess_mm > 0.0) key_swatch(drawing, y, kExcess, "excess");
}

}  // namespace

void add_rates_strip(Drawing& drawing, const Box& box, const LedgerStrips& strips) {
    const Capacity capacity = capacity_line(strips);
    Panel panel;
    panel.box = box;
    panel.x = strips.bare_time();
    panel.y = scale_axis(rates_top(strips, capacity), 4);
    const double top = panel.y.to;
    panel.layers = rate_layers(box, strips);
    const bool shown = capacity.most > 0.0 && capacity.least < top;
    const double capacity_width = std::min(kDashedLine, 2.0 * outline_width(box, strips.drawn));
    if (shown) panel.layers.push_back(line(capacity.rows, kInfiltration, capacity_width, true));
    drawing.panel(std::move(panel));
    strip_title(drawing, box, "where it goes", strips.units.rate_unit());
    rates_key(drawing, box, strips, capacity, shown);
}

}  // namespace rainledger
