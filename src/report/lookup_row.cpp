#include <algorithm>
#include <array>

#include "report/lookup_parts.hpp"
#include "report/text_table.hpp"

// One row of a published table, shown in full.
namespace rainledger {
namespace {

constexpr std::string_view kHang = "      ";

using Cells = std::array<std::string, 4>;  // label, value, range, in the source's unit

bool is_empty(const ValueView& view) {
    return !view.published.value && !view.published.range;
}

/// "13.3 to 593.8 mm", the unit once.
std::string range_words(const ValueRange& range, const ValueView& view, const Display& display) {
    const std::string low = shown_value(range.low, view, display);
    return low.substr(0, low.find(' ')) + " to " + shown_value(range.high, view, display);
}

/// In the source's unit, where that is another than the one shown.
std::string source_words(const ValueView& view, const Display& display) {
    if (!view.dimension) return {};
    const PublishedValue& published = view.published;
    const double some = published.value ? *published.value : published.range->low;
    const std::string shown = shown_value(some, view, display);
    if (shown.substr(shown.find(' ') + 1) == view.printed_unit) return {};
    const auto figure = [&](double canonical) {
        return four_figures(
            find_unit(view.printed_unit, *view.dimension)->from_canonical(canonical));
    };
    const std::string unit = " " + std::string(view.printed_unit);
    if (!published.range) return figure(some) + unit;
    const std::string range =
        figure(published.range->low) + " to " + figure(published.range->high) + unit;
    return published.value ? figure(some) + unit + " (" + range + ")" : range;
}

Cells cells_of(const ValueView& view, const Display& display) {
    Cells cells{std::string(view.label), "", "", source_words(view, display)};
    if (view.published.value) cells[1] = shown_value(*view.published.value, view, display);
    if (view.published.range) cells[2] = range_words(*view.published.range, view, display);
    if (view.fault) cells[0] += " *";
    return cells;
}

std::string values_text(const RowView& row, const Display& display) {
    constexpr std::array<std::string_view, 4> kHeadings{"", "value", "range", "source's unit"};
    std::vector<Cells> lines;
    for (const ValueView& view : row.values)
        if (!is_empty(view)) lines.push_back(cells_of(view, display));
    if (lines.empty()) return {};
    std::array<bool, 4> used{true, false, false, false};
    for (const Cells& line : lines)
        for (std::size_t i = 0; i < line.size(); ++i)
            used[i] = used[i] || !line[i].empty();
    TextTable table;
    for (std::size_t i = 0; i < used.size(); ++i)
        if (used[i]) table.column(kHeadings[i], Align::left);
    for (const Cells& line : lines) {
        std::vector<std::string> cells;
        for (std::size_t i = 0; i < used.size(); ++i)
            if (used[i]) cells.push_back(line[i]);
        table.row(std::move(cells));
    }
    return table.text();
}

}  // namespace

std::string row_text(const RowView& row, const Display& display) {
    std::string out = values_text(row, display);
    for (const ValueView& view : row.values)
        if (view.fault)
            out +=
                filled("  * " + std::string(view.label) + ": ", fault_words(view, display), kHang);
    for (const std::string_view note : row.notes)
        out += filled("  Note: ", note, kHang);
    return out + filled("  Source: ", citation(row.provenance), kHang);
}

}  // namespace rainledger
