#pragma once

#include <cstddef>
#include <map>
#include <string>
#include <vector>

#include "published/value_row.hpp"
#include "rainledger/base/quantity.hpp"

namespace rainledger::published {

/// The inputs of a check: names and quantities as text, read with the program's own unit reader. An
/// input with several numbers is swept: item i of the check takes its number i. Reading an input
/// marks it as used. Every reader throws std::runtime_error on a missing or wrong input.
class Inputs {
public:
    void add(const std::string& name, const std::string& text);

    [[nodiscard]] bool has(const std::string& name) const { return entries_.count(name) > 0; }
    /// A quantity in the canonical unit of `dimension`.
    [[nodiscard]] double quantity(const std::string& name, Dimension dimension, std::size_t item);
    [[nodiscard]] double number(const std::string& name, std::size_t item);
    /// All the numbers of an input, for an operation that takes them together.
    [[nodiscard]] std::vector<double> series(const std::string& name, Dimension dimension);

    [[nodiscard]] std::vector<std::string> unused() const;
    /// Inputs that were swept but hold numbers for more than `items` items.
    [[nodiscard]] std::vector<std::string> longer_than(std::size_t items) const;

private:
    struct Entry {
        ValueRow row;
        bool used = false;
        bool taken_whole = false;
    };

    Entry& entry(const std::string& name);
    static const Printed& at(const Entry& entry, const std::string& name, std::size_t item);

    std::map<std::string, Entry> entries_;
};

}  // namespace rainledger::published
