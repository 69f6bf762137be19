#include "chart/panel_grid.hpp"

namespace rainledger {
namespace {

constexpr double kBetween = 18.0;  // columns
constexpr double kTicksBelow = 20.0;

double panel_height(std::size_t rows) {
    if (rows == 1) return 190.0;
    return rows == 2 ? 130.0 : 110.0;
}

}  // namespace

Axis cell_time_axis(const TimeAxis& time, const GridCell& cell) {
    constexpr double kEnd = 0.93;
    Axis axis{0.0, time.span_h, time.ticks, cell.lowest};
    if (!cell.rightmost && axis.ticks.size() > 1 && axis.ticks.back().at > kEnd * time.span_h)
        axis.ticks.back().label.clear();
    return axis;
}

PanelGrid panel_grid(std::size_t panels, const GridRoom& room) {
    PanelGrid grid;
    grid.columns = panels == 2 || panels == 4 ? 2 : 3;
    if (panels == 1) grid.columns = 1;
    const std::size_t rows = (panels + grid.columns - 1) / grid.columns;
    const double high = panel_height(rows);
    const double row_height = high + room.head + kTicksBelow;
    grid.height = room.top + room.bottom - kTicksBelow + static_cast<double>(rows) * row_height;

    const auto columns = static_cast<double>(grid.columns);
    const double wide =
        (kPageWidth - room.left - room.right - kBetween * (columns - 1.0)) / columns;
    for (std::size_t i = 0; i < panels; ++i) {
        const std::size_t row = i / grid.columns;
        const std::size_t column = i % grid.columns;
        GridCell cell;
        cell.box.left = room.left + static_cast<double>(column) * (wide + kBetween);
        cell.box.right = cell.box.left + wide;
        cell.box.top = grid.height - room.top - room.head - static_cast<double>(row) * row_height;
        cell.box.bottom = cell.box.top - high;
        cell.title_y = cell.box.top + room.head - 13.0;
        cell.caption_y = cell.box.top + 12.0;
        cell.leftmost = column == 0;
        cell.rightmost = column + 1 == grid.columns || i + 1 == panels;
        cell.lowest = i + grid.columns >= panels;
        grid.cells.push_back(cell);
    }
    return grid;
}

}  // namespace rainledger
