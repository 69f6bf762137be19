#include "chart/hyetograph_drawing.hpp"

#include <algorithm>
#include <cstddef>
#include <string>
#include <utility>
#include <vector>

#include "chart/page.hpp"
#include "chart/panel_grid.hpp"
#include "chart/storm_view.hpp"
#include "chart/time_axis.hpp"
#include "rainledger/report/caution.hpp"

namespace rainledger {
namespace {

/// The axes that all panels of a chart share.
struct RainScale {
    Axis rates;
    Axis depths;
};

RainScale rain_scale(const std::vector<Hyetograph>& storms, const ChartUnits& units, int ticks) {
    double peak = 0.0;
    double depth = 0.0;
    for (const Hyetograph& own : storms) {
        peak = std::max(peak, units.shown(peak_intensity_mm_per_h(own)));
        depth = std::max(depth, units.shown(total_depth_mm(own)));
    }
    const Axis rates = scale_axis(peak, ticks);
    return {rates, matching_axis(depth, rates)};
}

/// Depth fallen by the end of each drawn step.
std::string cumulative_rows(const Hyetograph& own, const std::vector<DrawnStep>& drawn,
                            const ChartUnits& units) {
    std::string rows;
    append_row(rows, {0.0, 0.0});
    double fallen_mm = 0.0;
    std::size_t next = 0;
    for (const DrawnStep& step : drawn) {
        for (; next <= step.last; ++next)
            fallen_mm += own.depth_mm[next];
        append_row(rows, {step.to_h, units.shown(fallen_mm)});
    }
    return rows;
}

Panel rain_panel(const Box& box, const Axis& time, const Hyetograph& own, const RainScale& scale,
                 const ChartUnits& units) {
    Panel panel;
    panel.box = box;
    panel.x = time;
    panel.y = scale.rates;
    panel.right = scale.depths;
    const std::vector<double> rates = intensities(own);
    const auto drawn = drawn_steps(own, own.steps(), rates, kMostDrawn);
    const auto rate = [&](const DrawnStep& step) { return units.shown(rates[step.step]); };
    add_columns(panel, drawn, rate, kRain, kRainEdge);
    panel.right_layers.push_back(line(cumulative_rows(own, drawn, units), kInfiltration, kLine));
    return panel;
}

/// What the two axes and the two kinds of ink are, left and right at height `y`.
void rain_key(Drawing& drawing, double left, double right, double y, const ChartUnits& units) {
    constexpr double kWords = 108.0;
    drawing.swatch({left, left + 9.0, y - 4.5, y + 4.5}, kRain);
    drawing.text(left + 15.0, y, "intensity [" + std::string(units.rate_unit()) + "]", {kQuiet});
    drawing.dash(right - kWords - 20.0, right - kWords - 4.0, y, kInfiltration, kLine, false);
    drawing.text(right, y, "depth so far [" + std::string(units.depth_unit()) + "]",
                 {kQuiet, kTextSize, false, Align::right});
}

Drawing one_storm(const Scenario& scenario, const Storm& storm, const ChartUnits& units) {
    constexpr double kHeight = 434.0;  // 11.5 cm
    Drawing drawing(kHeight);
    const Hyetograph own = own_rain(storm.rain);
    page_title(drawing, scenario.title, joined(storm_words(storm), rain_words(own, units)));
    const Box box{48.0, kPageWidth - 52.0, 68.0, kHeight - 84.0};
    const TimeAxis time = time_axis(own, 10);
    drawing.panel(
        rain_panel(box, {0.0, time.span_h, time.ticks}, own, rain_scale({own}, units, 6), units));
    rain_key(drawing, kMargin, kPageWidth - kMargin, box.top + 22.0, units);
    time_title(drawing, box, time);
    page_caution(drawing, kRainCaution);
    return drawing;
}

Drawing several_storms(const Scenario& scenario, const ChartUnits& units) {
    std::vector<Hyetograph> storms;
    double longest_h = 0.0;
    for (const Storm& storm : scenario.storms) {
        storms.push_back(own_rain(storm.rain));
        longest_h = std::max(longest_h, span_h(storms.back()));
    }
    GridRoom room;
    room.right = 44.0;
    const PanelGrid grid = panel_grid(storms.size(), room);
    Drawing drawing(grid.height);
    page_title(drawing, scenario.title, "rain of each storm, on one scale");
    const RainScale scale = rain_scale(storms, units, 4);
    const TimeAxis time = shared_time_axis(longest_h, grid.columns == 2 ? 6 : 4);
    for (std::size_t i = 0; i < storms.size(); ++i) {
        const GridCell& cell = grid.cells[i];
        Panel panel = rain_panel(cell.box, cell_time_axis(time, cell), storms[i], scale, units);
        panel.y.labelled = cell.leftmost;
        panel.right->labelled = cell.rightmost;
        drawing.panel(std::move(panel));
        const std::size_t fits = panel_characters(cell.box);
        drawing.text(cell.box.left, cell.title_y, shortened(scenario.storms[i].name, fits),
                     {kInk, kTextSize, true});
        drawing.text(cell.box.left, cell.caption_y, short_rain_words(storms[i], units),
                     {kQuiet, kTextSize - 1.0});
    }
    rain_key(drawing, kMargin, kMargin + 260.0, 36.0, units);
    grid_time_title(drawing, time.title);
    page_caution(drawing, kRainCaution);
    return drawing;
}

}  // namespace

Drawing hyetograph_drawing(const Scenario& scenario, const ChartUnits& units) {
    if (scenario.storms.size() == 1) return one_storm(scenario, scenario.storms[0], units);
    return several_storms(scenario, units);
}

}  // namespace rainledger
