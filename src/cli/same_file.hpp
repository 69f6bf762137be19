#pragma once

#include <string>

namespace rainledger {

/// True if both paths name the same regular file, whether it exists yet or not. Devices and pipes
/// are never the same: two outputs may share them.
[[nodiscard]] bool is_same_file(const std::string& one, const std::string& other);

}  // namespace rainledger
