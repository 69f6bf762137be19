#include "chart/text_blocks.hpp"

#include <algorithm>
#include <array>
#include <cmath>

#include "chart/look.hpp"
#include "chart/words.hpp"
#include "rainledger/base/printable.hpp"

namespace rainledger {
namespace {

constexpr std::array<std::string_view, 9> kEighths{" ", "▁", "▂", "▃", "▄", "▅", "▆", "▇", "█"};

/// Levels filled out of `parts` a row and `rows` rows.
int filled_levels(double value, double top, std::size_t rows, int parts) {
    if (!(value > 0.0)) return 0;
    const double levels = static_cast<double>(rows) * parts;
    return std::clamp(static_cast<int>(std::lround(std::min(value / top, 1.0) * levels)), 1,
                      static_cast<int>(levels));
}

}  // namespace

std::vector<std::size_t> steps_of_columns(const Hyetograph& rain, std::size_t steps,
                                          std::span<const double> weight, double span_h,
                                          std::size_t columns) {
    const double per_column = span_h / static_cast<double>(columns);
    const auto column_of = [&](double hours) { return hours / per_column; };
    std::vector<std::size_t> shown(columns, kNoStep);
    for (std::size_t step = 0; step < steps; ++step) {
        const double from = column_of(rain.edges_h[step] - rain.edges_h.front());
        const double to = column_of(rain.edges_h[step + 1] - rain.edges_h.front());
        // The columns whose middle lies in the step, and the one that holds the step's middle.
        auto first = static_cast<std::size_t>(std::ceil(from - 0.5));
        auto end = static_cast<std::size_t>(std::ceil(to - 0.5));
        const auto own = static_cast<std::size_t>((from + to) / 2.0);
        first = std::min(first, own);
        end = std::min(std::max(end, own + 1), columns);
        for (std::size_t column = first; column < end; ++column)
            if (shown[column] == kNoStep || weight[step] > weight[shown[column]])
                shown[column] = step;
    }
    return shown;
}

std::vector<std::string> standing_blocks(std::span<const double> values, double top,
                                         std::size_t rows) {
    std::vector<std::string> out(rows);
    for (const double value : values) {
        const int levels = filled_levels(value, top, rows, 8);
        for (std::size_t row = 0; row < rows; ++row) {
            const int below = static_cast<int>(rows - 1 - row) * 8;
            out[row] += kEighths[static_cast<std::size_t>(std::clamp(levels - below, 0, 8))];
        }
    }
    return out;
}

std::vector<std::string> hanging_blocks(std::span<const double> values, double top,
                                        std::size_t rows) {
    constexpr std::array<std::string_view, 3> kHalves{" ", "▀", "█"};
    std::vector<std::string> out(rows);
    for (const double value : values) {
        const int levels = filled_levels(value, top, rows, 2);
        for (std::size_t row = 0; row < rows; ++row) {
            const int above = static_cast<int>(row) * 2;
            out[row] += kHalves[static_cast<std::size_t>(std::clamp(levels - above, 0, 2))];
        }
    }
    return out;
}

std::string scaled_row(std::string_view scale, std::string_view row) {
    const std::size_t used = std::min(scale.size(), kGutter - 2);
    std::string out(kGutter - 2 - used, ' ');
    out += scale.substr(0, used);
    out += scale.empty() ? " │" : " ┤";
    out += row;
    const std::size_t last = out.find_last_not_of(' ');
    return out.substr(0, last + 1) + "\n";
}

std::size_t rows_between_ticks(const std::vector<Tick>& ticks) {
    constexpr std::size_t kRows = 12;
    return std::max<std::size_t>(kRows / (ticks.size() - 1), 2);
}

std::string labelled_rows(std::string_view word, const std::vector<std::string>& rows) {
    std::string out;
    for (const std::string& row : rows) {
        const bool last = &row == &rows.back();
        const bool empty = row.find_first_not_of(' ') == std::string::npos;
        if (empty && (!last || word.empty())) continue;
        const std::string line = padded(last ? word : "", kGutter) + row;
        out += line.substr(0, line.find_last_not_of(' ') + 1) + "\n";
    }
    return out;
}

std::string time_rows(const TimeAxis& time, std::size_t columns) {
    std::vector<std::string_view> line(columns, "─");
    std::string labels(kGutter + columns + 1, ' ');
    std::size_t free = 0;
    for (const Tick& tick : time.ticks) {
        const auto at = std::min(
            columns - 1, static_cast<std::size_t>(
                             std::lround(tick.at / time.span_h * static_cast<double>(columns))));
        line[at] = "┬";
        const std::size_t half = tick.label.size() / 2;
        const std::size_t from = kGutter + at - std::min(half, kGutter);
        if (from < free || from + tick.label.size() > labels.size()) continue;
        labels.replace(from, tick.label.size(), tick.label);
        free = from + tick.label.size() + 1;
    }
    std::string out = std::string(kGutter - 3, ' ') + "0 └";
    for (const std::string_view part : line)
        out += part;
    out += "\n" + labels.substr(0, labels.find_last_not_of(' ') + 1) + "\n";
    return out + std::string(kGutter, ' ') + time.title + "\n";
}

std::string text_title(std::string_view title, std::string_view below) {
    std::string out = shortened(printable(title), kTextColumns) + "\n";
    if (!below.empty()) out += shortened(printable(below), kTextColumns) + "\n";
    return out + "\n";
}

std::string padded(std::string_view text, std::size_t columns) {
    std::string out = shortened(printable(text), columns);
    const std::size_t used = columns_used(out);
    out.append(columns - used, ' ');
    return out;
}

std::string repeated(std::string_view glyph, std::size_t times) {
    std::string out;
    for (std::size_t i = 0; i < times; ++i)
        out += glyph;
    return out;
}

}  // namespace rainledger
