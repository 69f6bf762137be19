#include "rainledger/base/quantity.hpp"

#include <array>
#include <cmath>
#include <cstddef>
#include <span>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/number.hpp"
#include "rainledger/base/unit_spellings.hpp"

// Conversion factors are exact by definition: inch 25.4 mm, foot 0.3048 m, acre 43,560 square feet,
// mile 5,280 feet, US gallon 231 cubic inches (NIST Handbook 44, appendix C, from memory).
namespace rainledger {
namespace {

struct NamedUnit {
    std::string_view name;
    Unit unit;
};

constexpr double kMmPerInch = 25.4;
constexpr double kMmPerFoot = 304.8;
constexpr double kM2PerSquareFoot = 0.09290304;
constexpr double kM3PerCubicFoot = 0.028316846592;
constexpr double kM3PerGallon = 0.003785411784;
constexpr double kMetresOfWaterPerKpaDivisor = 9.80665;  // kPa per metre of water column

constexpr std::array kDepthUnits{
    NamedUnit{"mm", {1.0, 1.0}},        NamedUnit{"cm", {10.0, 1.0}},
    NamedUnit{"m", {1000.0, 1.0}},      NamedUnit{"in", {kMmPerInch, 1.0}},
    NamedUnit{"ft", {kMmPerFoot, 1.0}},
};
constexpr std::array kTimeUnits{
    NamedUnit{"s", {1.0, 3600.0}}, NamedUnit{"min", {1.0, 60.0}}, NamedUnit{"h", {1.0, 1.0}},
    NamedUnit{"hr", {1.0, 1.0}},   NamedUnit{"d", {24.0, 1.0}},
};
constexpr std::array kDecayUnits{
    NamedUnit{"1/h", {1.0, 1.0}},    NamedUnit{"1/hr", {1.0, 1.0}}, NamedUnit{"1/min", {60.0, 1.0}},
    NamedUnit{"1/s", {3600.0, 1.0}}, NamedUnit{"1/d", {1.0, 24.0}},
};
constexpr std::array kAreaUnits{
    NamedUnit{"m2", {1.0, 1.0}},
    NamedUnit{"ha", {10000.0, 1.0}},
    NamedUnit{"km2", {1.0e6, 1.0}},
    NamedUnit{"ft2", {kM2PerSquareFoot, 1.0}},
    NamedUnit{"ac", {43560.0 * kM2PerSquareFoot, 1.0}},
    NamedUnit{"mi2", {5280.0 * 5280.0 * kM2PerSquareFoot, 1.0}},
};
constexpr std::array kVolumeUnits{
    NamedUnit{"m3", {1.0, 1.0}},           NamedUnit{"L", {1.0, 1000.0}},
    NamedUnit{"mL", {1.0, 1.0e6}},         NamedUnit{"ft3", {kM3PerCubicFoot, 1.0}},
    NamedUnit{"gal", {kM3PerGallon, 1.0}}, NamedUnit{"ac-ft", {43560.0 * kM3PerCubicFoot, 1.0}},
};
constexpr std::array kDischargeUnits{
    NamedUnit{"L/s", {1.0, 1.0}},
    NamedUnit{"m3/s", {1000.0, 1.0}},
    NamedUnit{"ft3/s", {1000.0 * kM3PerCubicFoot, 1.0}},
    NamedUnit{"cfs", {1000.0 * kM3PerCubicFoot, 1.0}},
    NamedUnit{"gpm", {1000.0 * kM3PerGallon, 60.0}},
};
constexpr std::array kSuctionUnits{
    NamedUnit{"mm", {1.0, 1.0}},        NamedUnit{"cm", {10.0, 1.0}},
    NamedUnit{"m", {1000.0, 1.0}},      NamedUnit{"in", {kMmPerInch, 1.0}},
    NamedUnit{"ft", {kMmPerFoot, 1.0}}, NamedUnit{"kPa", {1000.0, kMetresOfWaterPerKpaDivisor}},
};
constexpr double kSqrt60 = 7.745966692414834;
constexpr std::array kSorptivityUnits{
    NamedUnit{"mm/h^0.5", {1.0, 1.0}},
    NamedUnit{"cm/min^0.5", {10.0 * kSqrt60, 1.0}},
    NamedUnit{"in/h^0.5", {kMmPerInch, 1.0}},
};
constexpr std::array kFrequencyUnits{NamedUnit{"yr", {1.0, 1.0}}};

std::optional<Unit> find_in(std::span<const NamedUnit> units, std::string_view name) {
    for (const NamedUnit& candidate : units)
        if (candidate.name == name) return candidate.unit;
    return std::nullopt;
}

std::optional<Unit> find_rate(std::string_view name) {
    if (name == "um/s") return Unit{3.6, 1.0};
    const std::size_t slash = name.find('/');
    if (slash == std::string_view::npos) return std::nullopt;
    const auto depth = find_in(kDepthUnits, name.substr(0, slash));
    const auto time = find_in(kTimeUnits, name.substr(slash + 1));
    if (!depth || !time) return std::nullopt;
    return Unit{depth->multiply * time->divide, depth->divide * time->multiply};
}

constexpr bool is_blank(char c) {
    return c == ' ' || c == '\t';
}

std::string_view trimmed(std::string_view text) {
    while (!text.empty() && is_blank(text.front()))
        text.remove_prefix(1);
    while (!text.empty() && is_blank(text.back()))
        text.remove_suffix(1);
    return text;
}

struct NumberAndUnit {
    std::string_view number;
    std::string_view unit;
};

/// Splits "12.5 mm" after its last digit or point that belongs to the number. An exponent belongs
/// to the number only when digits follow it ("1e3 mm", but "3 ft" and "2 e").
NumberAndUnit split_number(std::string_view text) {
    const auto digit = [&](std::size_t i) {
        return i < text.size() && text[i] >= '0' && text[i] <= '9';
    };
    std::size_t end = 0;
    if (end < text.size() && (text[end] == '+' || text[end] == '-')) ++end;
    while (digit(end) || (end < text.size() && text[end] == '.'))
        ++end;
    if (end < text.size() && (text[end] == 'e' || text[end] == 'E')) {
        std::size_t exponent = end + 1;
        if (exponent < text.size() && (text[exponent] == '+' || text[exponent] == '-')) ++exponent;
        if (digit(exponent)) {
            while (digit(exponent))
                ++exponent;
            end = exponent;
        }
    }
    return {text.substr(0, end), trimmed(text.substr(end))};
}

ParsedQuantity refused(std::string problem, std::string hint) {
    return {std::nullopt, std::move(problem), std::move(hint)};
}

constexpr bool is_digit(char c) {
    return c >= '0' && c <= '9';
}

/// Whether a number goes on after a decimal comma or a mark for thousands: "4,800 m2", "4 800 m2".
bool goes_on(const NumberAndUnit& parts) {
    if (parts.number.empty() || parts.unit.empty()) return false;
    if (is_digit(parts.unit[0])) return true;
    return (parts.unit[0] == ',' || parts.unit[0] == '\'') && parts.unit.size() > 1 &&
           is_digit(parts.unit[1]);
}

constexpr const char* kPlainDigits = "write a decimal point, and no mark for thousands";

/// "0:10" or "00:10:00" as hours, minutes and seconds, written with a unit: "10 min".
std::optional<std::string> clock_time(std::string_view text) {
    constexpr double kMostSeconds = 1.0e9;
    double seconds = 0.0;
    double weight = 3600.0;
    for (int part = 0; part < 3; ++part, weight /= 60.0) {
        const std::size_t colon = text.find(':');
        if (part == 0 && colon == std::string_view::npos) return std::nullopt;
        const std::string_view digits = text.substr(0, colon);
        for (const char c : digits)
            if (!is_digit(c)) return std::nullopt;
        const auto number = parse_number(digits);
        if (!number) return std::nullopt;
        seconds += *number * weight;
        if (colon == std::string_view::npos) {
            if (!(seconds < kMostSeconds)) return std::nullopt;
            const bool minutes = std::fmod(seconds, 60.0) == 0.0;
            return minutes ? shortest(seconds / 60.0) + " min" : shortest(seconds) + " s";
        }
        text.remove_prefix(colon + 1);
    }
    return std::nullopt;
}

}  // namespace

std::optional<Unit> find_unit(std::string_view name, Dimension dimension) {
    switch (dimension) {
        case Dimension::depth:
            return find_in(kDepthUnits, name);
        case Dimension::rate:
            return find_rate(name);
        case Dimension::time:
            return find_in(kTimeUnits, name);
        case Dimension::decay:
            return find_in(kDecayUnits, name);
        case Dimension::area:
            return find_in(kAreaUnits, name);
        case Dimension::volume:
            return find_in(kVolumeUnits, name);
        case Dimension::discharge:
            return find_in(kDischargeUnits, name);
        case Dimension::suction:
            return find_in(kSuctionUnits, name);
        case Dimension::sorptivity:
            return find_in(kSorptivityUnits, name);
        case Dimension::frequency:
            return find_in(kFrequencyUnits, name);
    }
    return std::nullopt;
}

std::string_view accepted_units(Dimension dimension) {
    switch (dimension) {
        case Dimension::depth:
            return "mm, cm, m, in, ft";
        case Dimension::rate:
            return "mm/h, in/h, in/hr, cm/h, mm/min, um/s and the like";
        case Dimension::time:
            return "s, min, h, hr, d";
        case Dimension::decay:
            return "1/h, 1/hr, 1/min, 1/s, 1/d";
        case Dimension::area:
            return "m2, ha, km2, ft2, ac, mi2";
        case Dimension::volume:
            return "L, mL, m3, ft3, gal, ac-ft";
        case Dimension::discharge:
            return "L/s, m3/s, ft3/s, cfs, gpm";
        case Dimension::suction:
            return "mm, cm, m, in, ft, kPa";
        case Dimension::sorptivity:
            return "mm/h^0.5, cm/min^0.5, in/h^0.5";
        case Dimension::frequency:
            return "yr";
    }
    return "";
}

std::string_view example_quantity(Dimension dimension) {
    switch (dimension) {
        case Dimension::depth:
            return "12.5 mm";
        case Dimension::rate:
            return "3.4 mm/h";
        case Dimension::time:
            return "15 min";
        case Dimension::decay:
            return "4.14 1/h";
        case Dimension::area:
            return "0.42 ha";
        case Dimension::volume:
            return "12 m3";
        case Dimension::discharge:
            return "35 L/s";
        case Dimension::suction:
            return "110 mm";
        case Dimension::sorptivity:
            return "12 mm/h^0.5";
        case Dimension::frequency:
            return "10 yr";
    }
    return "";
}

std::string_view dimension_name(Dimension dimension) {
    switch (dimension) {
        case Dimension::depth:
            return "depth";
        case Dimension::rate:
            return "rate";
        case Dimension::time:
            return "time";
        case Dimension::decay:
            return "decay";
        case Dimension::area:
            return "area";
        case Dimension::volume:
            return "volume";
        case Dimension::discharge:
            return "discharge";
        case Dimension::suction:
            return "suction head";
        case Dimension::sorptivity:
            return "sorptivity";
        case Dimension::frequency:
            return "return period";
    }
    return "";
}

ParsedQuantity parse_quantity(std::string_view text, Dimension dimension) {
    const std::string what{dimension_name(dimension)};
    const std::string hint = "write a number with a unit, such as '" +
                             std::string(example_quantity(dimension)) +
                             "' (units: " + std::string(accepted_units(dimension)) + ")";
    const NumberAndUnit parts = split_number(trimmed(text));
    const auto number = parse_number(parts.number);
    if (dimension == Dimension::time)
        if (const auto clock = clock_time(trimmed(text)))
            return refused(in_quotes(text) + " is not a time", "write '" + *clock + "'");
    if (!number) {
        const std::string_view article = what.starts_with('a') ? "an" : "a";
        return refused(in_quotes(text) + " is not " + std::string(article) + " " + what, hint);
    }
    if (parts.unit.empty()) return refused(in_quotes(text) + " has no unit", hint);
    const auto unit = find_unit(parts.unit, dimension);
    if (!unit) {
        const std::string problem = in_quotes(parts.unit) + " is not a unit of " + what;
        if (const auto meant = meant_unit(parts.unit, dimension))
            return refused(problem, "did you mean '" + *meant + "'? (units: " +
                                        std::string(accepted_units(dimension)) + ")");
        if (goes_on(parts)) return refused(in_quotes(text) + " is not one number", kPlainDigits);
        return refused(problem, hint);
    }
    const double value = unit->to_canonical(*number);
    if (!(value >= -1.0e300 && value <= 1.0e300))
        return refused(in_quotes(text) + " is too large a number", hint);
    return {value, {}, {}};
}

ParsedQuantity parse_share(std::string_view text) {
    const NumberAndUnit parts = split_number(trimmed(text));
    const auto number = parse_number(parts.number);
    if (number && parts.unit.empty()) return {*number, {}, {}};
    if (number && parts.unit == "%") return {*number / 100.0, {}, {}};
    return refused(in_quotes(text) + " is not a share", "write a share such as '0.4' or '40 %'");
}

ParsedQuantity parse_bare_number(std::string_view text) {
    const NumberAndUnit parts = split_number(trimmed(text));
    const auto number = parse_number(parts.number);
    if (goes_on(parts)) return refused(in_quotes(text) + " is not one number", kPlainDigits);
    if (!number) return refused(in_quotes(text) + " is not a number", "");
    if (!parts.unit.empty())
        return refused(in_quotes(text) + " has a unit where a plain number belongs",
                       "write " + std::string(parts.number));
    return {*number, {}, {}};
}

}  // namespace rainledger
