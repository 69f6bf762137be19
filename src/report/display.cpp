#include "report/display.hpp"

#include <algorithm>
#include <cmath>

#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

constexpr double kHectareFromM2 = 100'000.0;  // a site from ten hectares reads better in ha
constexpr int kMostDecimals = 9;

double in_unit(double canonical, Dimension dimension, std::string_view unit) {
    return find_unit(unit, dimension)->from_canonical(canonical);
}

bool is_zero_text(std::string_view text) {
    return text.find_first_not_of("-0.") == std::string_view::npos;
}

}  // namespace

std::string_view Display::unit_of(Dimension dimension) const {
    switch (dimension) {
        case Dimension::depth:
        case Dimension::suction:
            return metric() ? "mm" : "in";
        case Dimension::rate:
            return metric() ? "mm/h" : "in/h";
        case Dimension::time:
            return "h";
        case Dimension::decay:
            return "1/h";
        case Dimension::area:
            return metric() ? "m2" : "ac";
        case Dimension::volume:
            return metric() ? "m3" : "ft3";
        case Dimension::discharge:
            return metric() ? "L/s" : "ft3/s";
        case Dimension::sorptivity:
            return metric() ? "mm/h^0.5" : "in/h^0.5";
        case Dimension::frequency:
            return "yr";
    }
    return "";
}

std::string Display::depth(double mm) const {
    return fixed(in_unit(mm, Dimension::depth, depth_unit()), metric() ? 1 : 2);
}

std::string Display::rate(double mm_per_h) const {
    return fixed(in_unit(mm_per_h, Dimension::rate, rate_unit()), metric() ? 1 : 2);
}

std::string Display::volume(double m3) const {
    return three_figures(in_unit(m3, Dimension::volume, volume_unit()));
}

std::string Display::flow(double l_per_s) const {
    return three_figures(in_unit(l_per_s, Dimension::discharge, flow_unit()));
}

std::string Display::area(double m2, std::string_view unit) const {
    const double value = in_unit(m2, Dimension::area, unit);
    const double small = unit == "m2" ? 10.0 : 0.1;
    if (value < small) return three_figures(value);
    if (unit == "m2" || value >= 10000.0) return fixed(value, 0);
    return fixed(value, value < 100.0 ? 3 : 1);
}

std::string_view Display::depth_unit() const {
    return unit_of(Dimension::depth);
}

std::string_view Display::depth_words() const {
    return metric() ? "mm" : "inches";
}

std::string_view Display::rate_unit() const {
    return unit_of(Dimension::rate);
}

std::string_view Display::volume_unit() const {
    return unit_of(Dimension::volume);
}

std::string_view Display::flow_unit() const {
    return unit_of(Dimension::discharge);
}

std::string_view Display::area_unit(double site_m2) const {
    if (metric() && site_m2 >= kHectareFromM2) return "ha";
    return unit_of(Dimension::area);
}

std::string Display::depth_with_unit(double mm) const {
    const std::string number = depth(mm);
    if (mm > 0.0 && is_zero_text(number)) return metric() ? "under 0.1 mm" : "under 0.01 in";
    return number + " " + std::string(depth_unit());
}

std::string Display::parameter(double canonical, Dimension dimension) const {
    const std::string_view unit = unit_of(dimension);
    return four_figures(in_unit(canonical, dimension, unit)) + " " + std::string(unit);
}

std::string four_figures(double value) {
    constexpr int kFigures = 4;
    if (value == 0.0) return "0";
    const int leading = static_cast<int>(std::floor(std::log10(std::abs(value))));
    std::string text = fixed(value, std::clamp(kFigures - 1 - leading, 0, kMostDecimals));
    if (text.find('.') == std::string::npos) return text;
    text.erase(text.find_last_not_of('0') + 1);
    if (text.ends_with('.')) text.pop_back();
    return text;
}

}  // namespace rainledger
