#pragma once

#include <cstddef>
#include <initializer_list>
#include <optional>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include "chart/look.hpp"
#include "chart/scale.hpp"
#include "chart/words.hpp"
#include "rainledger/chart/chart.hpp"

// A drawing, and the gnuplot script that draws it. Places are in page units from the lower left
// corner; every word that comes from outside goes through quoted().
namespace rainledger {

enum class Align { left, centre, right };

struct TextStyle {
    std::string_view colour = kInk;
    double size = kTextSize;
    bool bold = false;
    Align align = Align::left;
};

struct Box {
    double left = 0.0;
    double right = 0.0;
    double bottom = 0.0;
    double top = 0.0;
};

/// Something drawn in a panel: rows of numbers and what gnuplot makes of them.
struct Layer {
    std::string rows;
    std::string style;  ///< "using 1:2 with lines ..."
};

/// A row of numbers of a layer.
void append_row(std::string& rows, std::initializer_list<double> numbers);

/// What an area spans at a time.
struct Span {
    double at = 0.0;
    double low = 0.0;
    double high = 0.0;
};

/// An area along `spans` (rising in time), as one closed outline for each stretch in which it has
/// any thickness.
[[nodiscard]] Layer area(const std::vector<Span>& spans, std::string_view colour);
/// A line through columns 1 and 2; an empty row breaks it.
[[nodiscard]] Layer line(std::string rows, std::string_view colour, double width,
                         bool dashed = false);
/// Straight strokes from columns 1, 2 to columns 3, 4.
[[nodiscard]] Layer strokes(std::string rows, std::string_view colour, double width);

struct Panel {
    Box box;
    Axis x;
    Axis y;
    std::optional<Axis> right;  ///< a second vertical axis
    std::vector<Layer> layers;
    std::vector<Layer> right_layers;  ///< measured on the second axis
    bool axis = true;                 ///< a line at 0, from which the columns stand or hang
    bool guides = true;               ///< light lines at the ticks of y
};

class Drawing {
public:
    explicit Drawing(double height) : height_(height) {}

    [[nodiscard]] double height() const { return height_; }
    void text(double x, double y, std::string_view words, const TextStyle& style = {});
    void swatch(const Box& box, std::string_view colour);
    /// A short horizontal line, as a key to one in a panel.
    void dash(double left, double right, double y, std::string_view colour, double width,
              bool dashed);
    void panel(Panel panel) { panels_.push_back(std::move(panel)); }

    /// The script for a format other than text. The drawing has at least one panel.
    [[nodiscard]] std::string script(ChartFormat format) const;

private:
    double height_;
    std::string words_;  // labels, swatches and dashes, as script
    std::vector<Panel> panels_;
};

}  // namespace rainledger
