#include "chart/fit_marks.hpp"

#include <array>
#include <cmath>
#include <numbers>

#include <fmt/core.h>

namespace rainledger {
namespace {

/// A regular outline: corners, the direction of the first (turns from the right), and its size.
struct Shape {
    int corners;
    double first;
    double size;
};

// Disc, square, triangle, diamond, triangle on its tip; sizes look alike.
constexpr std::array kShapes{Shape{20, 0.0, 1.0}, Shape{4, 0.125, 1.2}, Shape{3, 0.25, 1.35},
                             Shape{4, 0.0, 1.3}, Shape{3, 0.75, 1.35}};

std::string outlines(std::span<const PanelPoint> points, const Shape& shape, double radius,
                     const Panel& panel) {
    const double x_unit = (panel.x.to - panel.x.from) / (panel.box.right - panel.box.left);
    const double y_unit = (panel.y.to - panel.y.from) / (panel.box.top - panel.box.bottom);
    std::string rows;
    for (const PanelPoint& point : points) {
        if (!rows.empty()) rows += '\n';
        for (int i = 0; i <= shape.corners; ++i) {
            const double turn =
                shape.first + static_cast<double>(i) / static_cast<double>(shape.corners);
            const double angle = 2.0 * std::numbers::pi * turn;
            append_row(rows, {point.x + radius * shape.size * std::cos(angle) * x_unit,
                              point.y + radius * shape.size * std::sin(angle) * y_unit});
        }
    }
    return rows;
}

Layer filled_layer(std::string rows, std::string_view colour) {
    return {std::move(rows),
            fmt::format("using 1:2 with filledcurves closed fillstyle solid 1 noborder "
                        "fillcolor rgb '{}'",
                        colour)};
}

}  // namespace

std::vector<Layer> marks(std::span<const PanelPoint> points, std::size_t pit, const Panel& panel) {
    const Shape& shape = kShapes[pit % kShapes.size()];
    const bool hollow = pit / kShapes.size() % 2 == 1;
    // A rim of paper keeps marks apart from curves below them.
    std::vector<Layer> layers{
        filled_layer(outlines(points, shape, kMarkRadius + 0.9, panel), kPaper),
        filled_layer(outlines(points, shape, kMarkRadius, panel), kInk)};
    if (hollow)
        layers.push_back(filled_layer(outlines(points, shape, kMarkRadius - 1.2, panel), kPaper));
    return layers;
}

}  // namespace rainledger
