#include "chart/page.hpp"

#include <string>

namespace rainledger {
namespace {

constexpr std::size_t kTitleCharacters = 72;

}  // namespace

void page_title(Drawing& drawing, std::string_view title, std::string_view below) {
    drawing.text(kMargin, drawing.height() - 20.0, shortened(title, kTitleCharacters),
                 {kInk, kTitleSize, true});
    drawing.text(kMargin, drawing.height() - 38.0, shortened(below, kBelowCharacters),
                 {kQuiet, kTextSize});
}

void time_title(Drawing& drawing, const Box& box, const TimeAxis& time) {
    drawing.text(box.right, box.bottom - 37.0, time.title,
                 {kQuiet, kTextSize, false, Align::right});
}

void page_caution(Drawing& drawing, std::string_view words) {
    drawing.text(kMargin, 9.0, words, {kQuiet, kSmallSize});
}

void grid_time_title(Drawing& drawing, std::string_view title) {
    drawing.text(kPageWidth - kMargin, 36.0, title, {kQuiet, kTextSize - 1.0, false, Align::right});
}

std::size_t panel_characters(const Box& box) {
    constexpr double kCharacter = 7.2;  // mean width in the bold size of a name
    return static_cast<std::size_t>((box.right - box.left) / kCharacter);
}

}  // namespace rainledger
