#include "scenario/schema_values.hpp"

namespace rainledger {
namespace {

constexpr const char* kNumber = "\\+?([0-9]+\\.?[0-9]*|\\.[0-9]+)([eE][+-]?[0-9]+)?";

/// The characters that act instead of being shown, inside a bracket expression.
constexpr const char* kHidden = "\\u0000-\\u001f\\u007f-\\u009f\\u2028-\\u202e\\u2066-\\u2069";

std::string escaped(std::string_view text) {
    std::string out;
    for (const char c : text) {
        if (c == '.' || c == '^') out += '\\';
        out += c;
    }
    return out;
}

/// "mm, cm" -> "mm|cm".
std::string alternatives(Dimension dimension) {
    std::string out = escaped(accepted_units(dimension));
    for (std::size_t at = out.find(", "); at != std::string::npos; at = out.find(", ", at))
        out.replace(at, 2, "|");
    return out;
}

std::string unit_pattern(Dimension dimension) {
    if (dimension != Dimension::rate) return alternatives(dimension);
    return "(" + alternatives(Dimension::depth) + ")/(" + alternatives(Dimension::time) + ")|um/s";
}

}  // namespace

Json closed(const std::vector<std::pair<std::string, Json>>& properties,
            const std::vector<std::string>& required, const Json& more) {
    Json schema = {{"type", "object"}, {"additionalProperties", false}};
    for (const auto& [key, value] : properties)
        schema["properties"][key] = value;
    if (!required.empty()) schema["required"] = required;
    schema.update(more);
    return schema;
}

Json one_required(const std::vector<std::string>& keys) {
    Json choices = Json::array();
    for (const std::string& key : keys)
        choices.push_back(Json::object({{"required", Json::array({key})}}));
    return Json::object({{"oneOf", choices}});
}

Json any_of(const std::vector<Json>& choices) {
    return Json::object({{"anyOf", choices}});
}

Json reference(const std::string& definition) {
    return Json::object({{"$ref", "#/$defs/" + definition}});
}

Json described(Json value, std::string_view description) {
    value["description"] = description;
    return value;
}

Json quantity(Dimension dimension, std::string_view description) {
    Json value = Json::object({{"type", "string"}});
    value["pattern"] =
        "^[ \\t]*" + std::string(kNumber) + "[ \\t]*(" + unit_pattern(dimension) + ")[ \\t]*$";
    value["examples"] = Json::array({example_quantity(dimension)});
    return described(value, std::string(description) + " A number with a unit: " +
                                std::string(accepted_units(dimension)) + ".");
}

Json text() {
    return Json::object({{"type", Json::array({"string", "number", "boolean"})}});
}

Json words(Words choices) {
    return Json::object({{"enum", std::vector<std::string>(choices.begin(), choices.end())}});
}

Json number(const Json& limits) {
    Json bare = Json::object({{"type", "number"}});
    bare.update(limits);
    const Json in_quotes = {{"type", "string"},
                            {"pattern", "^[ \\t]*" + std::string(kNumber) + "[ \\t]*$"}};
    return any_of({bare, in_quotes});
}

Json at_least_zero() {
    return number({{"minimum", 0}});
}

Json fraction() {
    return number({{"minimum", 0}, {"maximum", 1}});
}

Json shown_text(std::string_view refused) {
    Json value = text();
    value["pattern"] = "^[^" + std::string(refused) + kHidden + "]*$";
    return value;
}

Json name(std::string_view refused) {
    const std::string wrong = std::string(refused) + kHidden;
    return Json::object({{"pattern", "^ *[^ " + wrong + "][^" + wrong + "]*$"}});
}

Json share() {
    const Json number = {{"type", "number"}, {"exclusiveMinimum", 0}, {"maximum", 1}};
    const Json percentage = {{"type", "string"},
                             {"pattern", "^[ \\t]*" + std::string(kNumber) + "[ \\t]*%?[ \\t]*$"}};
    return described(any_of({number, percentage}), "Share of the excess, such as 0.3 or 30 %.");
}

}  // namespace rainledger
