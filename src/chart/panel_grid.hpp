#pragma once

#include <cstddef>
#include <vector>

#include "chart/drawing.hpp"
#include "chart/time_axis.hpp"

// Panels side by side on a page: where each stands.
namespace rainledger {

/// A panel's place: the box of its axes, and where in the grid it is.
struct GridCell {
    Box box;
    double title_y = 0.0;    ///< baseline of the name
    double caption_y = 0.0;  ///< of the lowest line below it
    bool leftmost = false;
    bool rightmost = false;
    bool lowest = false;  ///< none stands below it
};

struct PanelGrid {
    double height = 0.0;  ///< of the page
    std::size_t columns = 1;
    std::vector<GridCell> cells;
};

inline constexpr double kHeadLine = 15.0;  // one more line above a panel

/// Room that a grid leaves around its panels, page units.
struct GridRoom {
    double left = 44.0;
    double right = 14.0;
    double bottom = 78.0;  ///< time axis and foot lines
    double top = 54.0;     ///< title lines
    double head = 40.0;    ///< above a panel: its name and a line
};

/// The time axis of a panel: labelled where none stands below it, and not at its end where the next
/// panel's begins.
[[nodiscard]] Axis cell_time_axis(const TimeAxis& time, const GridCell& cell);

/// A grid for 2 to 12 panels, three side by side at most.
[[nodiscard]] PanelGrid panel_grid(std::size_t panels, const GridRoom& room);

}  // namespace rainledger
