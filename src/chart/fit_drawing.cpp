#include "chart/fit_drawing.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <string>
#include <utility>

#include <fmt/core.h>

#include "chart/fit_marks.hpp"
#include "chart/page.hpp"

namespace rainledger {
namespace {

constexpr double kHeight = 606.0;  // 16 cm
constexpr double kLeft = 48.0;
constexpr double kRight = 486.0;
constexpr double kBeside = kRight + 14.0;
constexpr Box kRatesBox{kLeft, kRight, 386.0, 528.0};
constexpr Box kDepthsBox{kLeft, kRight, 206.0, 344.0};
constexpr Box kResidualsBox{kLeft, kRight, 68.0, 164.0};
constexpr double kTitleRise = 15.0;
constexpr double kRoomForMark = 0.014;  // of the time, after the last reading
constexpr double kBetweenKeys = 29.0;
constexpr double kMeanLine = 2.6;  // the mean rate of an interval
constexpr double kSample = 22.0;   // length of a line in the key

/// The line of a law: its dashes tell it apart from the others where inks cannot.
struct Pen {
    std::string_view colour;
    std::string_view dashes;
};

constexpr std::array<Pen, kFieldLaws.size()> kPens{
    Pen{kExcess, "solid"}, Pen{kInfiltration, "(9,4)"}, Pen{kRainWords, "(2,3)"},
    Pen{kInfiltration, "(9,3,2,3)"}, Pen{kAxis, "(4,3)"}};

Layer pen_line(std::string rows, FieldLaw law, bool best) {
    constexpr double kBest = 2.2;
    constexpr double kOther = 1.2;
    const Pen& pen = kPens[static_cast<std::size_t>(law)];
    return {std::move(rows),
            fmt::format("using 1:2 with lines linewidth {:g} dashtype {} linecolor rgb '{}'",
                        best ? kBest : kOther, pen.dashes, pen.colour)};
}

/// Lines of all laws, the best on top; `rows_of` makes the rows of one.
template <class Rows>
void add_laws(Panel& panel, const FitView& view, const Rows& rows_of) {
    for (std::size_t i = view.laws.size(); i-- > 0;)
        panel.layers.push_back(pen_line(rows_of(*view.laws[i]), view.laws[i]->law, i == 0));
}

/// The marks of all pits; `point_of` places one.
template <class Point>
void add_marks(Panel& panel, const FitView& view, const Point& point_of) {
    for (std::size_t pit = 0; pit < view.pits.size(); ++pit) {
        std::vector<PanelPoint> points;
        for (const FitMark& mark : view.marks)
            if (mark.pit == pit) points.push_back(point_of(mark));
        for (Layer& layer : marks(points, pit, panel))
            panel.layers.push_back(std::move(layer));
    }
}

Panel panel_of(const Box& box, const FitView& view, Axis y, bool labelled) {
    Panel panel;
    panel.box = box;
    panel.x = {0.0, (1.0 + kRoomForMark) * view.time.span_h, view.time.ticks, labelled};
    panel.y = std::move(y);
    return panel;
}

void panel_title(Drawing& drawing, const Box& box, std::string_view words, std::string_view unit) {
    drawing.text(kMargin, box.top + kTitleRise, fmt::format("{} [{}]", words, unit), {kQuiet});
}

void add_rates(Drawing& drawing, const FitView& view, const ChartUnits& units) {
    Panel panel = panel_of(kRatesBox, view, scale_axis(units.shown(view.rates_top), 4), false);
    if (view.pits.size() == 1) {
        std::string means;
        for (const FitMark& mark : view.marks)
            append_row(means, {mark.start_h, units.shown(mark.rate_mm_per_h), mark.end_h,
                               units.shown(mark.rate_mm_per_h)});
        panel.layers.push_back(strokes(std::move(means), kRain, kMeanLine));
    }
    add_laws(panel, view, [&](const LawFit& law) {
        std::string rows;
        for (const CurvePoint& point : law.curve)
            if (std::isfinite(point.rate_mm_per_h))
                append_row(rows, {point.time_h, units.shown(point.rate_mm_per_h)});
        return rows;
    });
    add_marks(panel, view, [&](const FitMark& mark) {
        return PanelPoint{mark.middle_h, units.shown(mark.rate_mm_per_h)};
    });
    drawing.panel(std::move(panel));
    panel_title(drawing, kRatesBox, view.rates_words, units.rate_unit());
}

void add_depths(Drawing& drawing, const FitView& view, const ChartUnits& units) {
    Panel panel = panel_of(kDepthsBox, view, scale_axis(units.shown(view.depths_top), 4), false);
    add_laws(panel, view, [&](const LawFit& law) {
        std::string rows;
        for (const CurvePoint& point : law.curve)
            append_row(rows, {point.time_h, units.shown(point.depth_mm)});
        return rows;
    });
    add_marks(panel, view, [&](const FitMark& mark) {
        return PanelPoint{mark.end_h, units.shown(mark.depth_mm)};
    });
    drawing.panel(std::move(panel));
    panel_title(drawing, kDepthsBox, "infiltrated so far", units.depth_unit());
}

/// As far below zero as above, with room for the marks.
Axis symmetric_axis(double most) {
    constexpr double kHeadroom = 1.08;
    const Axis half = scale_axis(kHeadroom * most, 2);
    Axis axis{-half.to, half.to, {}, true};
    for (std::size_t i = half.ticks.size(); i-- > 1;)
        axis.ticks.push_back({-half.ticks[i].at, "-" + half.ticks[i].label});
    axis.ticks.insert(axis.ticks.end(), half.ticks.begin(), half.ticks.end());
    return axis;
}

void add_residuals(Drawing& drawing, const FitView& view, const ChartUnits& units) {
    Panel panel =
        panel_of(kResidualsBox, view, symmetric_axis(units.shown(view.residuals_top)), true);
    panel.axis = false;  // its line would run over the marks
    std::string zero;
    append_row(zero, {panel.x.from, 0.0, panel.x.to, 0.0});
    panel.layers.push_back(strokes(std::move(zero), kAxis, kThinLine));
    const bool every_law = view.pits.size() == 1;
    if (every_law)
        add_laws(panel, view, [&](const LawFit& law) {
            std::string rows;
            for (const FittedReading& reading : law.readings)
                append_row(rows, {reading.end_h, units.shown(reading.residual_mm)});
            return rows;
        });
    if (!view.laws.empty())
        add_marks(panel, view, [&](const FitMark& mark) {
            return PanelPoint{mark.end_h, units.shown(mark.residual_mm)};
        });
    drawing.panel(std::move(panel));
    std::string words = "read less fitted depth";
    if (!every_law && !view.laws.empty())
        words += ", " + std::string(field_law_name(view.laws.front()->law));
    panel_title(drawing, kResidualsBox, words, units.depth_unit());
    time_title(drawing, kResidualsBox, view.time);
}

/// A bare panel beside the others for samples of lines and marks, `rows` below one another.
Panel key_panel(double top, double height, double rows) {
    Panel panel;
    panel.box = {kBeside, kBeside + kSample, top - height, top};
    panel.y = {0.0, rows, {}, false};
    panel.axis = false;
    panel.guides = false;
    return panel;
}

/// The lines of the laws, the best first, with their errors.
void add_law_key(Drawing& drawing, const FitView& view, const ChartUnits& units) {
    if (view.laws.empty()) return;
    const double rows = static_cast<double>(view.laws.size());
    Panel samples = key_panel(kRatesBox.top, kBetweenKeys * rows, rows);
    for (std::size_t i = 0; i < view.laws.size(); ++i) {
        const double from_top = static_cast<double>(i) + 0.25;
        std::string ends;
        append_row(ends, {0.0, rows - from_top});
        append_row(ends, {1.0, rows - from_top});
        samples.layers.push_back(pen_line(std::move(ends), view.laws[i]->law, i == 0));
        const double y = kRatesBox.top - kBetweenKeys * from_top;
        drawing.text(kBeside + kSample + 5.0, y, field_law_name(view.laws[i]->law),
                     {kInk, kTextSize - 1.0, i == 0});
        drawing.text(kBeside + kSample + 5.0, y - 12.5, error_words(*view.laws[i], units),
                     {kQuiet, kSmallSize});
    }
    drawing.panel(std::move(samples));
}

/// What the marks are: readings, or each pit's; of very many pits the first.
void add_mark_key(Drawing& drawing, const FitView& view) {
    constexpr double kRow = 16.0;
    constexpr std::size_t kMostRows = 17;
    constexpr std::size_t kCharacters = 18;
    const std::size_t pits = view.pits.size();
    const std::size_t listed = pits > kMostRows ? kMostRows - 1 : pits;
    const double rows = static_cast<double>(listed);
    const double words_left = kBeside + kSample + 5.0;
    const auto y_of = [&](std::size_t row) {
        return kDepthsBox.top - kRow * (static_cast<double>(row) + 0.5);
    };
    Panel samples = key_panel(kDepthsBox.top, kRow * rows, rows);
    for (std::size_t pit = 0; pit < listed; ++pit) {
        const PanelPoint middle{0.5, rows - static_cast<double>(pit) - 0.5};
        for (Layer& layer : marks({&middle, 1}, pit, samples))
            samples.layers.push_back(std::move(layer));
        drawing.text(words_left, y_of(pit),
                     pits > 1 ? shortened(view.pits[pit], kCharacters) : "readings",
                     {kInk, kTextSize - 1.0});
    }
    if (listed < pits)
        drawing.text(words_left, y_of(listed), fmt::format("and {} more", pits - listed),
                     {kQuiet, kTextSize - 1.0});
    drawing.panel(std::move(samples));
}

}  // namespace

Drawing fit_drawing(std::string_view title, const FitView& view, const ChartUnits& units) {
    Drawing drawing(kHeight);
    page_title(drawing, title, view.words);
    add_rates(drawing, view, units);
    add_depths(drawing, view, units);
    add_residuals(drawing, view, units);
    add_law_key(drawing, view, units);
    add_mark_key(drawing, view);
    drawing.text(kMargin, 9.0, kFitCaution, {kQuiet, kSmallSize});
    return drawing;
}

}  // namespace rainledger
