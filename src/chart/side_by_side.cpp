#include "chart/side_by_side.hpp"

#include <algorithm>
#include <string>
#include <utility>
#include <vector>

#include "chart/page.hpp"
#include "chart/panel_grid.hpp"
#include "chart/supply_strip.hpp"
#include "rainledger/report/caution.hpp"

namespace rainledger {
namespace {

constexpr double kBetweenStrips = 12.0;
constexpr double kKeyY = 36.0;

/// The scales that all panels share.
struct SharedScale {
    Axis supply;
    Axis losses;
    TimeAxis time;
};

double peak_loss(std::span<const StepRates> rates) {
    double peak = 0.0;
    for (const StepRates& rate : rates)
        peak = std::max({peak, rate.infiltrated, rate.excess});
    return peak;
}

SharedScale shared_scale(const ChosenLosses& losses,
                         const std::vector<std::vector<StepRates>>& rates, int most_ticks) {
    double supply = 0.0;
    double loss = 0.0;
    double longest_h = 0.0;
    for (std::size_t i = 0; i < rates.size(); ++i) {
        supply = std::max(supply, peak_supply(rates[i]));
        loss = std::max(loss, peak_loss(rates[i]));
        longest_h = std::max(longest_h, span_h(losses.views[i].storm->rain));
    }
    supply = measurable(supply);
    loss = std::clamp(loss, supply / 10.0, 10.0 * supply);
    // One tick distance, and one length per mm/h, above and below.
    const std::vector<Tick> both = round_ticks(supply + loss, 5);
    const double step = both[1].at;
    return {stepped_axis(supply, step), stepped_axis(loss, step),
            losses.same_storm ? time_axis(losses.views.front().storm->rain, most_ticks)
                              : shared_time_axis(longest_h, most_ticks)};
}

Panel loss_strip(const Box& box, const Axis& time, const Axis& up,
                 const std::vector<DrawnStep>& drawn, const std::vector<StepRates>& rates) {
    Panel panel;
    panel.box = box;
    panel.x = time;
    panel.y = up;
    const auto excess = [&](const DrawnStep& step) { return rates[step.step].excess; };
    const auto infiltrated = [&](const DrawnStep& step) { return rates[step.step].infiltrated; };
    add_columns(panel, drawn, excess, kExcess, kExcess);
    panel.layers.push_back(
        stepped_line(drawn, infiltrated, kInfiltration, outline_width(box, drawn)));
    return panel;
}

void add_panel(Drawing& drawing, const LossView& view, const GridCell& cell,
               const std::vector<StepRates>& rates, const SharedScale& scale,
               const ChartUnits& units) {
    const auto drawn = drawn_steps(view, rates, kMostDrawn / 2);
    const Axis time = cell_time_axis(scale.time, cell);
    const double upper_top = scale.supply.to;
    const double lower_top = scale.losses.to;
    const double per_unit =
        (cell.box.top - cell.box.bottom - kBetweenStrips) / (upper_top + lower_top);
    Box upper = cell.box;
    upper.bottom = upper.top - per_unit * upper_top;
    Box lower = cell.box;
    lower.top = lower.bottom + per_unit * lower_top;
    Panel supply = supply_strip(upper, time, scale.supply, drawn, rates);
    supply.y.labelled = cell.leftmost;
    Panel losses = loss_strip(lower, time, scale.losses, drawn, rates);
    losses.y.labelled = cell.leftmost;
    drawing.panel(std::move(supply));
    drawing.panel(std::move(losses));
    drawing.text(cell.box.left, cell.title_y, shortened(view.name, panel_characters(cell.box)),
                 {kInk, kTextSize, true});
    drawing.text(cell.box.left, cell.title_y - kHeadLine, view.method, {kQuiet, kTextSize - 1.0});
    drawing.text(cell.box.left, cell.caption_y, excess_words(view, "coefficient", units),
                 {kQuiet, kTextSize - 1.0});
}

/// What the inks mean, along the foot of the page.
void side_by_side_key(Drawing& drawing, bool run_on, const ChartUnits& units) {
    double x = kMargin;
    const auto word = [&](std::string_view words, double width) {
        drawing.text(x + 14.0, kKeyY, words, {kInk, kTextSize - 1.0});
        x += width;
    };
    const auto ink = [&](std::string_view colour) {
        drawing.swatch({x, x + 9.0, kKeyY - 4.5, kKeyY + 4.5}, colour);
    };
    ink(kRain);
    word("rain", 52.0);
    if (run_on) {
        ink(kRunOn);
        word("run-on", 68.0);
    }
    ink(kExcess);
    word("excess", 70.0);
    drawing.dash(x - 5.0, x + 10.0, kKeyY, kInfiltration, kLine, false);
    word("infiltration", 96.0);
    drawing.text(x, kKeyY, "[" + std::string(units.rate_unit()) + "]", {kQuiet, kTextSize - 1.0});
}

}  // namespace

Drawing side_by_side_drawing(std::string_view title, const ChosenLosses& losses,
                             const ChartUnits& units) {
    GridRoom room;
    if (!losses.views.front().method.empty()) room.head += kHeadLine;
    const PanelGrid grid = panel_grid(losses.views.size(), room);
    std::vector<std::vector<StepRates>> rates;
    for (const LossView& view : losses.views)
        rates.push_back(step_rates(view, units));
    const SharedScale scale = shared_scale(losses, rates, grid.columns == 2 ? 6 : 4);
    Drawing drawing(grid.height);
    page_title(drawing, title, losses.about + "; coefficient: excess over rain, by volume");
    for (std::size_t i = 0; i < rates.size(); ++i)
        add_panel(drawing, losses.views[i], grid.cells[i], rates[i], scale, units);
    const bool run_on =
        std::any_of(losses.views.begin(), losses.views.end(),
                    [](const LossView& view) { return view.total.run_on_mm > 0.0; });
    side_by_side_key(drawing, run_on, units);
    grid_time_title(drawing, scale.time.title);
    page_caution(drawing, kCaution);
    return drawing;
}

}  // namespace rainledger
