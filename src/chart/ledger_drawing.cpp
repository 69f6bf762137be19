#include "chart/ledger_drawing.hpp"

#include <string>
#include <utility>
#include <variant>
#include <vector>

#include "chart/ledger_strips.hpp"
#include "chart/page.hpp"
#include "chart/supply_strip.hpp"
#include "rainledger/report/caution.hpp"

namespace rainledger {
namespace {

constexpr double kHeight = 530.0;  // 14 cm
constexpr Box kSupplyBox{kStripsLeft, kStripsRight, 396.0, 452.0};
constexpr Box kRatesBox{kStripsLeft, kStripsRight, 240.0, 363.0};
constexpr Box kPondedBox{kStripsLeft, kStripsRight, 227.0, 233.0};
constexpr Box kAccountsBox{kStripsLeft, kStripsRight, 66.0, 194.0};

void add_supply(Drawing& drawing, const LedgerStrips& strips) {
    const Axis down = scale_axis(peak_supply(strips.rates), 2);
    drawing.panel(supply_strip(kSupplyBox, strips.bare_time(), down, strips.drawn, strips.rates));
    const bool run_on = strips.view.total.run_on_mm > 0.0;
    strip_title(drawing, kSupplyBox, run_on ? "rain and run-on" : "rain", strips.units.rate_unit());
    key_swatch(drawing, kSupplyBox.top - 8.0, kRain, "rain");
    if (run_on) key_swatch(drawing, kSupplyBox.top - 24.0, kRunOn, "run-on");
}

/// Ponded intervals as a bar; those closer than the page can show are one.
std::vector<Span> ponded_spans(const LedgerStrips& strips) {
    const double first = strips.view.storm->rain.edges_h.front();
    const double least_gap = strips.time.span_h / static_cast<double>(kMostDrawn);
    std::vector<Span> spans;
    for (const PondedInterval& interval : strips.view.ponding) {
        const double from = interval.start_h - first;
        const double to = interval.end_h ? *interval.end_h - first : strips.time.span_h;
        if (!spans.empty() && from - spans.back().at < least_gap) {
            spans.resize(spans.size() - 2);
        } else {
            spans.push_back({from, 0.0, 0.0});
            spans.push_back({from, 0.0, 1.0});
        }
        spans.push_back({to, 0.0, 1.0});
        spans.push_back({to, 0.0, 0.0});
    }
    return spans;
}

void add_ponded(Drawing& drawing, const LedgerStrips& strips) {
    const Losses& losses = strips.view.surface->losses;
    if (std::holds_alternative<Impervious>(losses) || std::holds_alternative<CurveNumber>(losses))
        return;
    Panel panel;
    panel.box = kPondedBox;
    panel.x = {0.0, strips.time.span_h, {}, false};
    panel.guides = false;
    panel.axis = false;
    const bool ponds = !strips.view.ponding.empty();
    if (ponds) {
        panel.layers.push_back(area(ponded_spans(strips), kInk));
        drawing.panel(std::move(panel));
    }
    drawing.text(kBesideStrips, kPondedBox.bottom + 2.0, ponds ? "ponded" : "never ponded",
                 {kInk, kTextSize - 1.0});
}

}  // namespace

Drawing ledger_drawing(std::string_view title, const ChosenLosses& losses,
                       const ChartUnits& units) {
    const LossView& view = losses.views.front();
    LedgerStrips strips{view, units, step_rates(view, units), {}, time_axis(view.storm->rain, 8)};
    strips.drawn = drawn_steps(view, strips.rates, kMostDrawn);
    Drawing drawing(kHeight);
    page_title(drawing, title, ledger_words(losses, units, kBelowCharacters));
    add_supply(drawing, strips);
    add_rates_strip(drawing, kRatesBox, strips);
    add_ponded(drawing, strips);
    add_accounts_strip(drawing, kAccountsBox, strips);
    page_caution(drawing, kCaution);
    return drawing;
}

}  // namespace rainledger
