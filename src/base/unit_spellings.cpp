#include "rainledger/base/unit_spellings.hpp"

#include <array>
#include <cstddef>

namespace rainledger {
namespace {

struct Spelling {
    std::string_view typed;  ///< lower case
    std::string_view here;
};

constexpr std::size_t kLongestUnit = 40;  // longer than any spelling; bounds the work

/// Signs and words inside a unit, replaced in this order wherever they stand.
constexpr auto kSigns = std::to_array<Spelling>({
    {"\xC2\xB2", "2"},               // superscript two
    {"\xC2\xB3", "3"},               // superscript three
    {"\xC2\xB5", "u"},               // micro sign
    {"\xCE\xBC", "u"},               // Greek mu
    {"\xE2\x81\xBB\xC2\xB9", "-1"},  // superscript minus one
    {"\xE2\x88\x9A", "sqrt"},        // root sign
    {"^2", "2"},
    {"^3", "3"},
    {"^-1", "-1"},
    {" per ", "/"},
    {"per ", "/"},
    {"square ", "sq"},
    {"sq. ", "sq"},
    {"sq ", "sq"},
    {"cubic ", "cu"},
    {"cu ", "cu"},
    {" / ", "/"},
    {" /", "/"},
    {"/ ", "/"},
    {"sqrt(h)", "h^0.5"},
    {"sqrt(hr)", "h^0.5"},
    {"sqrt(min)", "min^0.5"},
    {"sqrt h", "h^0.5"},
    {"sqrth", "h^0.5"},
    {"^(1/2)", "^0.5"},
    {"^1/2", "^0.5"},
    {"h1/2", "h^0.5"},
    {"h0.5", "h^0.5"},
    {"hr^0.5", "h^0.5"},
});

/// Whole units, or one side of a slash.
constexpr auto kSpellings = std::to_array<Spelling>({
    {"millimetre", "mm"},
    {"millimetres", "mm"},
    {"millimeter", "mm"},
    {"millimeters", "mm"},
    {"centimetre", "cm"},
    {"centimetres", "cm"},
    {"centimeter", "cm"},
    {"centimeters", "cm"},
    {"metre", "m"},
    {"metres", "m"},
    {"meter", "m"},
    {"meters", "m"},
    {"inch", "in"},
    {"inches", "in"},
    {"ins", "in"},
    {"\"", "in"},
    {"foot", "ft"},
    {"feet", "ft"},
    {"sec", "s"},
    {"secs", "s"},
    {"second", "s"},
    {"seconds", "s"},
    {"mins", "min"},
    {"minute", "min"},
    {"minutes", "min"},
    {"hrs", "h"},
    {"hour", "h"},
    {"hours", "h"},
    {"day", "d"},
    {"days", "d"},
    {"yrs", "yr"},
    {"year", "yr"},
    {"years", "yr"},
    {"y", "yr"},
    {"a", "yr"},
    {"sqm", "m2"},
    {"sqmetre", "m2"},
    {"sqmetres", "m2"},
    {"sqmeter", "m2"},
    {"sqmeters", "m2"},
    {"sqkm", "km2"},
    {"sqft", "ft2"},
    {"sf", "ft2"},
    {"sqfeet", "ft2"},
    {"sqmi", "mi2"},
    {"sqmile", "mi2"},
    {"sqmiles", "mi2"},
    {"acre", "ac"},
    {"acres", "ac"},
    {"hectare", "ha"},
    {"hectares", "ha"},
    {"l", "L"},
    {"litre", "L"},
    {"litres", "L"},
    {"liter", "L"},
    {"liters", "L"},
    {"ml", "mL"},
    {"millilitre", "mL"},
    {"millilitres", "mL"},
    {"milliliter", "mL"},
    {"milliliters", "mL"},
    {"cc", "mL"},
    {"cm3", "mL"},
    {"cum", "m3"},
    {"cumetre", "m3"},
    {"cumetres", "m3"},
    {"cumeter", "m3"},
    {"cumeters", "m3"},
    {"cuft", "ft3"},
    {"cufeet", "ft3"},
    {"gallon", "gal"},
    {"gallons", "gal"},
    {"acre-foot", "ac-ft"},
    {"acre-feet", "ac-ft"},
    {"acre-ft", "ac-ft"},
    {"acft", "ac-ft"},
    {"af", "ac-ft"},
    {"lps", "L/s"},
    {"cumec", "m3/s"},
    {"cumecs", "m3/s"},
    {"cusec", "ft3/s"},
    {"cusecs", "ft3/s"},
    {"gal/min", "gpm"},
    {"kpa", "kPa"},
    {"mmh", "mm/h"},
    {"mmph", "mm/h"},
    {"mmhr", "mm/h"},
    {"iph", "in/h"},
    {"inhr", "in/h"},
    {"micron/s", "um/s"},
});

std::string in_plain_signs(std::string_view typed) {
    std::string out(typed);
    for (char& c : out)
        if (c >= 'A' && c <= 'Z') c = static_cast<char>(c - 'A' + 'a');
    for (const Spelling& sign : kSigns)
        for (std::size_t at = out.find(sign.typed); at != std::string::npos;
             at = out.find(sign.typed, at + sign.here.size()))
            out.replace(at, sign.typed.size(), sign.here);
    return out;
}

std::string_view without_full_stop(std::string_view word) {
    return word.ends_with('.') ? word.substr(0, word.size() - 1) : word;
}

std::string spelled_here(std::string_view typed) {
    const std::string_view word = without_full_stop(typed);
    for (const Spelling& spelling : kSpellings)
        if (spelling.typed == word) return std::string(spelling.here);
    return std::string(word);
}

/// "mm h-1" and "h-1" with a slash: "mm/h", "1/h".
std::string with_slash(std::string_view unit) {
    if (unit.starts_with('/')) return "1" + std::string(unit);
    if (!unit.ends_with("-1")) return std::string(unit);
    const std::string_view base = unit.substr(0, unit.size() - 2);
    const std::size_t blank = base.find_last_of(" .*");
    if (blank == std::string_view::npos) return "1/" + std::string(base);
    return std::string(base.substr(0, blank)) + "/" + std::string(base.substr(blank + 1));
}

}  // namespace

std::optional<std::string> meant_unit(std::string_view typed, Dimension dimension) {
    if (typed.size() > kLongestUnit) return std::nullopt;
    const std::string plain = with_slash(in_plain_signs(typed));
    std::string whole = spelled_here(plain);
    if (find_unit(whole, dimension)) return whole;
    const std::size_t slash = plain.find('/');
    if (slash == std::string::npos) return std::nullopt;
    const std::string_view sides = plain;
    std::string joined =
        spelled_here(sides.substr(0, slash)) + "/" + spelled_here(sides.substr(slash + 1));
    if (find_unit(joined, dimension)) return joined;
    return std::nullopt;
}

}  // namespace rainledger
