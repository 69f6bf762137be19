#include "chart/ledger_strips.hpp"

#include <string>

namespace rainledger {

void strip_title(Drawing& drawing, const Box& box, std::string_view words, std::string_view unit) {
    drawing.text(kMargin, box.top + kStripTitleRise,
                 std::string(words) + " [" + std::string(unit) + "]", {kQuiet});
}

void key_swatch(Drawing& drawing, double y, std::string_view colour, std::string_view words) {
    drawing.swatch({kBesideStrips, kBesideStrips + 9.0, y - 4.5, y + 4.5}, colour);
    drawing.text(kBesideStrips + 15.0, y, words, {kInk, kTextSize - 1.0});
}

void key_line(Drawing& drawing, double y, double width, bool dashed, std::string_view words) {
    drawing.dash(kBesideStrips - 4.0, kBesideStrips + 12.0, y, kInfiltration, width, dashed);
    drawing.text(kBesideStrips + 15.0, y, words, {kInk, kTextSize - 1.0});
}

}  // namespace rainledger
