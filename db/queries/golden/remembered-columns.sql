select `heading_key` as `key`, `field`
from (select * from import_columns where branch_id in (select value from json_each(?))) as `import_columns`
inner join `branches` on `branches`.`id` = `import_columns`.`branch_id`
where `branches`.`code` = ? and `kind` = ?;
