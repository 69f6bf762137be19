#include "chart/text_fit.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <vector>

#include <fmt/core.h>

#include "chart/text_blocks.hpp"
#include "chart/words.hpp"
#include "rainledger/base/printable.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kCurve = "·";
constexpr std::string_view kReading = "●";

/// A field of characters; rows from the top.
class Canvas {
public:
    Canvas(std::size_t rows, double span_h)
        : span_h_(span_h), cells_(rows, std::vector<std::string>(kTextWidth, " ")) {}

    /// Puts a glyph at a time and at a share of the height, measured from the top.
    void put(double time_h, double from_top, std::string_view glyph) {
        if (!(from_top >= 0.0 && from_top <= 1.0)) return;
        cells_[row_of(from_top)][column_of(time_h)] = glyph;
    }
    void rule(double from_top, std::string_view glyph) {
        std::ranges::fill(cells_[row_of(from_top)], std::string(glyph));
    }
    [[nodiscard]] std::size_t rows() const { return cells_.size(); }
    [[nodiscard]] std::string row(std::size_t index) const {
        std::string out;
        for (const std::string& cell : cells_[index])
            out += cell;
        return out;
    }
    /// The time in the middle of a column.
    [[nodiscard]] double time_h(std::size_t column) const {
        return (static_cast<double>(column) + 0.5) * span_h_ / static_cast<double>(kTextWidth);
    }

private:
    [[nodiscard]] std::size_t row_of(double from_top) const {
        const auto row = static_cast<std::size_t>(from_top * static_cast<double>(cells_.size()));
        return std::min(row, cells_.size() - 1);
    }
    [[nodiscard]] std::size_t column_of(double time_h) const {
        const auto column =
            static_cast<std::size_t>(time_h / span_h_ * static_cast<double>(kTextWidth));
        return std::min(column, kTextWidth - 1);
    }

    double span_h_;
    std::vector<std::vector<std::string>> cells_;
};

/// The mark of a pit: a letter where there are several.
std::string glyph_of(const FitView& view, std::size_t pit) {
    constexpr std::size_t kLetters = 26;
    if (view.pits.size() == 1) return std::string(kReading);
    return std::string(1, static_cast<char>('A' + pit % kLetters));
}

/// A panel from 0 up: the best law's curve, and the readings on it.
template <class Curve, class Time, class Value>
std::string panel(const FitView& view, double top, const Curve& curve, const Time& time_of,
                  const Value& value_of) {
    const std::vector<Tick> ticks = round_ticks(top, 4);
    const std::size_t rows_per_tick = rows_between_ticks(ticks);
    Canvas canvas((ticks.size() - 1) * rows_per_tick, view.time.span_h);
    const auto from_top = [&](double value) { return 1.0 - value / ticks.back().at; };
    if (!view.laws.empty())
        for (std::size_t column = 0; column < kTextWidth; ++column) {
            const double time_h = canvas.time_h(column);
            if (time_h >= view.laws.front()->curve.front().time_h)
                canvas.put(time_h, from_top(curve(time_h)), kCurve);
        }
    for (const FitMark& mark : view.marks)
        canvas.put(time_of(mark), from_top(value_of(mark)), glyph_of(view, mark.pit));
    std::string out;
    for (std::size_t row = 0; row < canvas.rows(); ++row) {
        const std::size_t tick = ticks.size() - 1 - row / rows_per_tick;
        out += scaled_row(row % rows_per_tick == 0 ? ticks[tick].label : "", canvas.row(row));
    }
    return out + time_rows(view.time, kTextWidth);
}

std::string rates(const FitView& view, const ChartUnits& units) {
    return fmt::format("{} [{}]\n", view.rates_words, units.rate_unit()) +
           panel(
               view, units.shown(view.rates_top),
               [&](double time_h) {
                   return units.shown(curve_rate_mm_per_h(view.laws.front()->curve, time_h));
               },
               [](const FitMark& mark) { return mark.middle_h; },
               [&](const FitMark& mark) { return units.shown(mark.rate_mm_per_h); });
}

std::string depths(const FitView& view, const ChartUnits& units) {
    return fmt::format("infiltrated so far [{}]\n", units.depth_unit()) +
           panel(
               view, units.shown(view.depths_top),
               [&](double time_h) {
                   return units.shown(curve_depth_mm(view.laws.front()->curve, time_h));
               },
               [](const FitMark& mark) { return mark.end_h; },
               [&](const FitMark& mark) { return units.shown(mark.depth_mm); });
}

std::string residuals(const FitView& view, const ChartUnits& units) {
    constexpr std::size_t kRows = 7;
    if (view.laws.empty()) return {};
    double most = 0.0;
    for (const FitMark& mark : view.marks)
        most = std::max(most, std::abs(units.shown(mark.residual_mm)));
    const Tick top = round_ticks(most, 2).back();
    Canvas canvas(kRows, view.time.span_h);
    canvas.rule(0.5, kCurve);
    for (const FitMark& mark : view.marks)
        canvas.put(mark.end_h, 0.5 - 0.5 * units.shown(mark.residual_mm) / top.at,
                   glyph_of(view, mark.pit));
    std::string out = fmt::format("read less fitted depth [{}]\n", units.depth_unit());
    for (std::size_t row = 0; row < kRows; ++row) {
        std::string label;
        if (row == 0) label = top.label;
        if (row == kRows / 2) label = "0";
        if (row + 1 == kRows) label = "-" + top.label;
        out += scaled_row(label, canvas.row(row));
    }
    return "\n" + out;
}

std::string key(const FitView& view, const ChartUnits& units) {
    std::string out;
    for (std::size_t pit = 0; pit < view.pits.size(); ++pit)
        out +=
            fmt::format("{} {}\n", glyph_of(view, pit),
                        view.pits.size() == 1 ? std::string("readings")
                                              : shortened(printable(view.pits[pit]), kNameColumns));
    for (const LawFit* law : view.laws)
        out += fmt::format("{} {}, {}\n", law == view.laws.front() ? kCurve : " ",
                           field_law_name(law->law), error_words(*law, units));
    return out;
}

}  // namespace

std::string text_fit(std::string_view title, const FitView& view, const ChartUnits& units) {
    return text_title(title, view.words) + rates(view, units) + "\n" + depths(view, units) +
           residuals(view, units) + "\n" + key(view, units);
}

}  // namespace rainledger
