#include "cli/same_file.hpp"

#include <filesystem>
#include <system_error>

namespace rainledger {

bool is_same_file(const std::string& one, const std::string& other) {
    namespace fs = std::filesystem;
    std::error_code ignored;
    if (fs::exists(one, ignored) && fs::exists(other, ignored))
        return fs::is_regular_file(one, ignored) && fs::equivalent(one, other, ignored);
    const fs::path first = fs::weakly_canonical(one, ignored);
    const fs::path second = fs::weakly_canonical(other, ignored);
    return !first.empty() && fs::absolute(first, ignored) == fs::absolute(second, ignored);
}

}  // namespace rainledger
