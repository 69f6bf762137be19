#include "published/inputs.hpp"

#include <stdexcept>

namespace rainledger::published {
namespace {

double canonical(const Printed& number, const std::string& unit, Dimension dimension) {
    const ParsedQuantity parsed = parse_quantity(number.text + " " + unit, dimension);
    if (!parsed.value) throw std::runtime_error(parsed.problem);
    return *parsed.value;
}

}  // namespace

void Inputs::add(const std::string& name, const std::string& text) {
    if (!entries_.emplace(name, Entry{parse_value_row(text)}).second)
        throw std::runtime_error("input '" + name + "' stands twice");
}

Inputs::Entry& Inputs::entry(const std::string& name) {
    const auto found = entries_.find(name);
    if (found == entries_.end()) throw std::runtime_error("input '" + name + "' is missing");
    found->second.used = true;
    return found->second;
}

const Printed& Inputs::at(const Entry& entry, const std::string& name, std::size_t item) {
    const std::vector<Printed>& numbers = entry.row.numbers;
    if (numbers.size() == 1) return numbers.front();
    if (item >= numbers.size()) throw std::runtime_error("input '" + name + "' is too short");
    return numbers[item];
}

double Inputs::quantity(const std::string& name, Dimension dimension, std::size_t item) {
    const Entry& found = entry(name);
    return canonical(at(found, name, item), found.row.unit, dimension);
}

double Inputs::number(const std::string& name, std::size_t item) {
    const Entry& found = entry(name);
    if (!found.row.unit.empty()) throw std::runtime_error("input '" + name + "' takes no unit");
    return at(found, name, item).value;
}

std::vector<double> Inputs::series(const std::string& name, Dimension dimension) {
    Entry& found = entry(name);
    found.taken_whole = true;
    std::vector<double> values;
    for (const Printed& number : found.row.numbers)
        values.push_back(canonical(number, found.row.unit, dimension));
    return values;
}

std::vector<std::string> Inputs::unused() const {
    std::vector<std::string> names;
    for (const auto& [name, entry] : entries_)
        if (!entry.used) names.push_back(name);
    return names;
}

std::vector<std::string> Inputs::longer_than(std::size_t items) const {
    std::vector<std::string> names;
    for (const auto& [name, entry] : entries_)
        if (!entry.taken_whole && entry.row.numbers.size() > items) names.push_back(name);
    return names;
}

}  // namespace rainledger::published
