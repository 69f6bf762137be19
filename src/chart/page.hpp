#pragma once

#include <algorithm>
#include <cstddef>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include "chart/drawing.hpp"
#include "chart/drawn_steps.hpp"
#include "chart/time_axis.hpp"

// What pages of every kind have in common.
namespace rainledger {

inline constexpr std::size_t kBelowCharacters = 92;  // in the line below the title

/// The title and the line below it, shortened to the page.
void page_title(Drawing& drawing, std::string_view title, std::string_view below);

/// The name of a time axis, under its ticks.
void time_title(Drawing& drawing, const Box& box, const TimeAxis& time);

/// The last line of a page.
void page_caution(Drawing& drawing, std::string_view words);

/// The name of the time axis below a grid of panels.
void grid_time_title(Drawing& drawing, std::string_view title);

/// Characters that fit across a panel in the size of its name.
[[nodiscard]] std::size_t panel_characters(const Box& box);

/// A stepped area from `low_of` to `high_of` of a DrawnStep.
template <class Low, class High>
[[nodiscard]] Layer stepped_area(const std::vector<DrawnStep>& steps, const Low& low_of,
                                 const High& high_of, std::string_view colour) {
    std::vector<Span> spans;
    for (const DrawnStep& step : steps) {
        spans.push_back({step.from_h, low_of(step), high_of(step)});
        spans.push_back({step.to_h, low_of(step), high_of(step)});
    }
    return area(spans, colour);
}

/// The upper outline of such an area above the axis; where nothing stands there is no line.
template <class High>
[[nodiscard]] Layer stepped_line(const std::vector<DrawnStep>& steps, const High& high_of,
                                 std::string_view colour, double width) {
    std::string rows;
    bool standing = false;
    for (const DrawnStep& step : steps) {
        const double high = high_of(step);
        if (standing != (high > 0.0)) append_row(rows, {step.from_h, 0.0});
        if (standing && !(high > 0.0)) rows += '\n';
        standing = high > 0.0;
        if (!standing) continue;
        append_row(rows, {step.from_h, high});
        append_row(rows, {step.to_h, high});
    }
    if (standing) append_row(rows, {steps.back().to_h, 0.0});
    return line(std::move(rows), colour, width);
}

/// Page units that a drawn step takes across a panel, on average.
[[nodiscard]] inline double step_width(const Box& box, const std::vector<DrawnStep>& steps) {
    return (box.right - box.left) / static_cast<double>(steps.size());
}

/// The width of a stepped line that does not fill the steps it outlines.
[[nodiscard]] inline double outline_width(const Box& box, const std::vector<DrawnStep>& steps) {
    constexpr double kThinnest = 0.4;
    constexpr double kShareOfStep = 0.3;
    return std::clamp(kShareOfStep * step_width(box, steps), kThinnest, kLine);
}

/// Columns that stand on (or hang from) the axis; thin gaps tell wide neighbours apart. The panel
/// has its box and its time axis.
template <class Rate>
void add_columns(Panel& panel, const std::vector<DrawnStep>& steps, const Rate& rate_of,
                 std::string_view colour, std::string_view edge) {
    constexpr double kLeastWidth = 5.0;     // page units, for gaps
    constexpr double kLeastOutlined = 2.5;  // for an edge darker than the column
    const double least_h = kLeastWidth * panel.x.to / (panel.box.right - panel.box.left);
    panel.layers.push_back(stepped_area(
        steps, [](const DrawnStep& /*step*/) { return 0.0; }, rate_of, colour));
    std::string gaps;
    for (std::size_t i = 1; i < steps.size(); ++i) {
        const double height = std::min(rate_of(steps[i - 1]), rate_of(steps[i]));
        const bool wide = steps[i - 1].to_h - steps[i - 1].from_h >= least_h &&
                          steps[i].to_h - steps[i].from_h >= least_h;
        if (wide && height > 0.0) append_row(gaps, {steps[i].from_h, 0.0, steps[i].from_h, height});
    }
    panel.layers.push_back(strokes(std::move(gaps), kPaper, kThinLine));
    if (step_width(panel.box, steps) >= kLeastOutlined)
        panel.layers.push_back(stepped_line(steps, rate_of, edge, kThinLine));
}

}  // namespace rainledger
